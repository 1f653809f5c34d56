"""The short script an engineer would otherwise write for a folder of waveforms.

Reads each CSV with a data-frame library, takes Welch's averaged spectrum, slides a comb of orders
over the told speed within 3 %, and holds the lines against a running median. It is what the
screening's speed is measured beside; its verdict is of no interest here.

    python3 usual_script.py FOLDER     (FOLDER/index.json lists the files)

Prints the seconds of each file as one JSON list, the reading of the packages left out.
"""

import json
import os
import sys
import time

for name in ("OMP_NUM_THREADS", "OPENBLAS_NUM_THREADS", "MKL_NUM_THREADS"):
    os.environ.setdefault(name, "1")

import numpy as np  # noqa: E402
import pandas as pd  # noqa: E402
from scipy import signal  # noqa: E402

ORDERS = np.arange(1, 21)


def screen(path, sample_rate_hz, speed_rpm):
    samples = pd.read_csv(path, comment="#").iloc[:, -1].to_numpy()
    frequency_hz, density = signal.welch(samples, fs=sample_rate_hz, window="hann", nperseg=4096)
    step_hz = frequency_hz[1]
    told_hz = speed_rpm / 60
    best = (-1.0, told_hz)
    for speed_hz in np.linspace(0.97 * told_hz, 1.03 * told_hz, 301):
        lines = np.round(ORDERS * speed_hz / step_hz).astype(int)
        lines = lines[lines < density.size]
        best = max(best, (float(np.log(density[lines] + 1e-30).sum()), speed_hz))
    floor = pd.Series(density).rolling(31, center=True, min_periods=1).median().to_numpy()
    lines = np.round(ORDERS * best[1] / step_hz).astype(int)
    lines = lines[lines < density.size]
    out = density[lines] > 4 * floor[lines]
    run = 0
    while run < out.size and out[run]:
        run += 1
    return best[1], run


def main():
    folder = sys.argv[1]
    with open(os.path.join(folder, "index.json"), encoding="utf-8") as file:
        entries = json.load(file)
    seconds = []
    for entry in entries:
        start = time.perf_counter()
        screen(os.path.join(folder, entry["file"]), entry["sampleRateHz"], entry["speedRpm"])
        seconds.append(time.perf_counter() - start)
    print(json.dumps(seconds))


main()
