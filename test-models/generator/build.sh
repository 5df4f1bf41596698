#!/usr/bin/env sh
# Rebuilds test-models/step from the generator. Needs g++ and libocct-data-exchange-dev.
set -eu
here=$(cd "$(dirname "$0")" && pwd)
mkdir -p "$here/../target"
g++ -std=c++17 -O1 -Wall -Wno-deprecated-declarations -I/usr/include/opencascade "$here/generate_models.cpp" -o "$here/../target/generate_models" \
  -lTKXDESTEP -lTKXCAF -lTKLCAF -lTKCAF -lTKCDF -lTKSTEP -lTKXSBase -lTKFillet -lTKBool -lTKBO -lTKPrim -lTKShHealing -lTKTopAlgo -lTKGeomAlgo \
  -lTKBRep -lTKGeomBase -lTKG3d -lTKG2d -lTKMath -lTKernel
"$here/../target/generate_models" "$here/../step"
