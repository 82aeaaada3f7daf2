"""Reference values for plain-tensor.ts from scikit-image (Debian's python3-skimage, /usr/bin/python3).

Run: /usr/bin/python3 scripts/endgrain/skimage-reference.py > scripts/endgrain/skimage-reference.json
"""
import json

import numpy as np
import skimage
from skimage.feature import structure_tensor

y, x = np.mgrid[0:60, 0:180].astype(float)
radius = np.hypot(x - 40, y - 130)
image = np.floor(128 + 50 * np.sin(0.45 * radius) + 0.2 * x + 15 * np.sin(1.3 * x + 2.1 * y))

out = {"scikitImage": skimage.__version__, "sums": float(image.sum()), "tensors": []}
for sigma in (1.0, 1.5, 3.0):
    yy, xy, xx = structure_tensor(image, sigma=sigma, mode="reflect", order="rc")
    places = [(0, 0), (5, 7), (30, 90), (59, 179), (12, 150)]
    angles = []
    for s in range(9):
        cut = slice(s * 180 // 9, (s + 1) * 180 // 9)
        normal = np.arctan2(2 * xy[:, cut].sum(), (xx[:, cut] - yy[:, cut]).sum()) / 2
        angles.append(float(np.degrees(np.arctan2(abs(np.cos(normal)), abs(np.sin(normal))))))
    out["tensors"].append({
        "sigma": sigma,
        "places": [{"x": b, "y": a, "xx": float(xx[a, b]), "xy": float(xy[a, b]), "yy": float(yy[a, b])} for a, b in places],
        "stationAngles": angles,
    })
print(json.dumps(out, indent=2))
