// Solids that the models are made of. Lengths in millimetres, angles in degrees.
#pragma once

#include <TopoDS_Edge.hxx>
#include <TopoDS_Shape.hxx>
#include <gp_Dir.hxx>
#include <gp_Pnt.hxx>
#include <gp_Vec.hxx>

#include <functional>
#include <vector>

TopoDS_Shape moved(const TopoDS_Shape& s, double x, double y, double z);

TopoDS_Shape placed(const TopoDS_Shape& s, double x, double y, double z);

// Turned and shifted by odd amounts: nothing lies along an axis any more.
TopoDS_Shape askew(const TopoDS_Shape& s);

TopoDS_Shape nurbs(const TopoDS_Shape& s);

TopoDS_Shape sphere(double r, double x = 0, double y = 0, double z = 0);

TopoDS_Shape box(double x0, double y0, double z0, double x1, double y1, double z1);

TopoDS_Shape cylinder(double r, double h, const gp_Pnt& at, const gp_Dir& along);

TopoDS_Shape revolved(const std::vector<TopoDS_Edge>& edges);

TopoDS_Edge line(const gp_Pnt& a, const gp_Pnt& b);

// Ellipsoid of revolution about z with semi-axes a (polar) and b, or its half above z = 0.
TopoDS_Shape spheroid(double a, double b, bool half);

// Half ball above z = 0.
TopoDS_Shape halfBall(double r);

// Rod of radius r along z with balls of radius `ball` about z = -l and z = l.
TopoDS_Shape ballEndedRod(double r, double l, double ball);

// Sphere of radius r1 about the origin and one of radius r2 about z = d, joined by the cone that touches both.
TopoDS_Shape pear(double r1, double r2, double d);

// Tube with rounded rims: bore R, wall w, half length l.
TopoDS_Shape tube(double bore, double wall, double l);

// Flat disc about z with a rim of radius h (fully rounded): radius r in all, half thickness h.
TopoDS_Shape roundedDisc(double r, double h);

// Fillets every edge that the choice takes, by the edge's mid-point and direction.
TopoDS_Shape filleted(const TopoDS_Shape& s, double r,
                      const std::function<bool(const gp_Pnt&, const gp_Vec&)>& take);

TopoDS_Shape rounded(const TopoDS_Shape& s, double r);

TopoDS_Shape solidOf(const TopoDS_Shape& s);

// Prism along z (from -l to l) of a triangle-like wedge: interior angle at the origin, flanks of length a.
TopoDS_Shape wedgeBar(double degrees, double flank, double l);

TopoDS_Shape hollowBox(double x, double y, double z, double wall);
