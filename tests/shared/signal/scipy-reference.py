"""Reference values by SciPy for the method's arithmetic, as JSON on standard output.

Made with SciPy 1.10.1 and NumPy 1.24.2 (Debian packages python3-scipy, python3-numpy):
    python3 tests/shared/signal/scipy-reference.py > tests/shared/signal/scipy-reference.json
The records are formulas, so that both sides have the same samples bit for bit, or nearly.
"""

import json

import numpy as np
from scipy import fft, signal, special, stats


def record(count):
    """A chirp with a slow line: every line of its transform is there."""
    i = np.arange(count, dtype=float)
    return np.sin(0.37 * i + 2e-4 * i * i) + 0.5 * np.cos(0.011 * i) + 0.1


transforms = []
for count in (16, 257, 1000, 1024, 12000):
    lines = fft.rfft(record(count))
    picked = [int(k) for k in np.linspace(0, len(lines) - 1, 9)]
    transforms.append(
        {"count": count, "lines": [[k, float(lines[k].real), float(lines[k].imag)] for k in picked]}
    )

# Over the shaft angle: 64 points a turn, segments of 16 turns, overlapping by half.
turns = 16
angle_record = record(64 * 100)
_, welch = signal.welch(
    angle_record,
    fs=64,
    window="hann",
    nperseg=64 * turns,
    noverlap=32 * turns,
    detrend=False,
    scaling="spectrum",
)
welch_picked = [int(k) for k in np.linspace(1, 25 * turns, 12)]

print(
    json.dumps(
        {
            "transforms": transforms,
            "welch": {
                "turns": turns,
                "count": len(angle_record),
                "lines": [[k, float(welch[k])] for k in welch_picked],
            },
            "logGamma": [[x, float(special.gammaln(x))] for x in (0.1, 0.5, 1.0, 3.7, 12.0, 250.5)],
            "gammaTail": [
                [a, x, float(stats.gamma.sf(x, a))]
                for a, x in (
                    (1.0, 6.9), (4.0, 13.0), (0.5, 0.01), (8.0, 2.0), (8.0, 40.0), (30.5, 60.0)
                )
            ],
            "fisherTail": [
                [r, n, m, float(stats.f.sf(r, 2 * n, 2 * m))]
                for r, n, m in (
                    (1.0, 3.0, 8.0), (7.0, 1.0, 20.0), (3.2, 4.0, 12.5), (50.0, 5.5, 30.0),
                    (0.2, 2.0, 2.0), (400.0, 7.0, 9.0)
                )
            ],
            "hannNoiseBandwidth": float(
                4096 * np.sum(signal.get_window("hann", 4096) ** 2)
                / np.sum(signal.get_window("hann", 4096)) ** 2
            ),
        },
        indent=1,
    )
)
