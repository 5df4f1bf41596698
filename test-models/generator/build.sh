#!/usr/bin/env sh
# Rebuilds test-models/step and MANIFEST.csv from the generator. Needs g++ and libocct-data-exchange-dev.
set -eu
here=$(cd "$(dirname "$0")" && pwd)
models=$(dirname "$here")
mkdir -p "$models/target" "$models/step"
g++ -std=c++17 -O1 -Wall -Wno-deprecated-declarations -I/usr/include/opencascade "$here"/*.cpp -o "$models/target/generate_models" \
  -lTKXDESTEP -lTKXCAF -lTKLCAF -lTKCAF -lTKCDF -lTKSTEP -lTKXSBase -lTKFillet -lTKBool -lTKBO -lTKPrim -lTKShHealing -lTKTopAlgo -lTKGeomAlgo \
  -lTKBRep -lTKGeomBase -lTKG3d -lTKG2d -lTKMath -lTKernel
"$models/target/generate_models" "$models/step" "$models/MANIFEST.csv"
