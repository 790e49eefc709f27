"""Sends a file of cases to a Skewlight server and prints the Kerr angles of every point.

    SKEWLIGHT_TOKEN=skw_... python3 data/examples/solve.py [cases.json]

The token comes from your account page. SKEWLIGHT_URL names the server when it is not on this machine.
Needs nothing but the standard library.
"""

import json
import os
import pathlib
import sys
import urllib.error
import urllib.request

server = os.environ.get("SKEWLIGHT_URL", "http://127.0.0.1:4310")
token = os.environ.get("SKEWLIGHT_TOKEN")
if not token:
    sys.exit("Put an API token of your account page into SKEWLIGHT_TOKEN.")
default_cases = pathlib.Path(__file__).with_name("cases.json")
cases = pathlib.Path(sys.argv[1] if len(sys.argv) > 1 else default_cases).read_bytes()

request = urllib.request.Request(
    server + "/api/v1/solve",
    data=cases,
    headers={"Authorization": "Bearer " + token, "Content-Type": "application/json"},
)
try:
    with urllib.request.urlopen(request) as response:
        answer = json.load(response)
except urllib.error.HTTPError as refusal:
    error = json.load(refusal)["error"]
    lines = [f"  {issue['path']}: {issue['message']}" for issue in error.get("issues", [])]
    sys.exit("\n".join([error["message"], *lines]))

print("wavelength_nm angle_deg light rotation_deg ellipticity_deg")
for result in answer["results"]:
    for point in result["points"]:
        for light in ("p", "s"):
            # None where no light comes back that could have a polarization.
            kerr = point["kerr"][light] or {"rotationDeg": float("nan"), "ellipticityDeg": float("nan")}
            print(
                f"{point['wavelengthNm']:g} {point['angleDeg']:g} {light} "
                f"{kerr['rotationDeg']:.4f} {kerr['ellipticityDeg']:.4f}"
            )
