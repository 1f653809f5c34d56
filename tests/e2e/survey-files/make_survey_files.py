"""Makes the CSV files of the main browser test, outside the product: plain Python, no code shared with it.

A loose pump bearing is a mass on a spring that lifts off its seat: one degree of freedom, contact on
both sides of a gap, driven by unbalance, integrated with small steps. The sound machines are the same
without the gap. Run it in its own folder to write the files again; they are checked in.
"""

import math
import random

RATE_HZ = 5120
SAMPLES = 8192
STEPS = 8
G = 9.80665


def machine(speed_hz, gap_um, unbalance_um, noise_g, seed, blades=5, blade_g=0.03):
    """Acceleration of a bearing housing in g, SAMPLES long."""
    rng = random.Random(seed)
    dt = 1 / (RATE_HZ * STEPS)
    mass_kg = 40.0
    base_n_per_m = 2.0e7 if gap_um == 0 else 2.0e6
    contact_n_per_m = 9.0e7
    damping = 2 * 0.04 * math.sqrt((base_n_per_m + contact_n_per_m) * mass_kg)
    gap_m = gap_um * 1e-6
    omega = 2 * math.pi * speed_hz
    force_n = mass_kg * unbalance_um * 1e-6 * omega**2
    weight_n = mass_kg * G * 0.25
    x = v = 0.0
    out = []
    settle = RATE_HZ // 2
    for n in range(settle + SAMPLES):
        for k in range(STEPS):
            t = (n * STEPS + k) * dt
            if x > gap_m:
                contact = contact_n_per_m * (x - gap_m)
            elif x < -gap_m:
                contact = contact_n_per_m * (x + gap_m)
            else:
                contact = 0.0
            push = force_n * math.cos(omega * t) - weight_n
            a = (push - base_n_per_m * x - contact - damping * v) / mass_kg
            v += a * dt
            x += v * dt
        if n >= settle:
            blade = blade_g * math.sin(2 * math.pi * blades * speed_hz * n / RATE_HZ)
            out.append(a / G + blade + rng.gauss(0, noise_g))
    return out


def write(name, comments, header, rows, line_end="\n"):
    with open(name, "w", encoding="utf-8", newline="") as file:
        for key, value in comments.items():
            file.write(f"# {key}: {value}{line_end}")
        if header:
            file.write(header + line_end)
        file.write(line_end.join(rows) + line_end)


def to_velocity_mm_s(acceleration_g):
    """Integrates by trapezes and takes out the drift with a slow high-pass."""
    out, v, low = [], 0.0, 0.0
    previous = acceleration_g[0]
    for a in acceleration_g:
        v += (a + previous) / 2 * G * 1000 / RATE_HZ
        previous = a
        low += (v - low) * (2 * math.pi * 1.0 / RATE_HZ)
        out.append(v - low)
    return out


def main():
    common = {"taken_at": "2026-11-30T09:12:00Z", "sample_rate_hz": RATE_HZ, "line_frequency_hz": 50}
    sound = machine(24.7, 0, 18, 0.02, 1)
    write(
        "P-101_M-DE_H.csv",
        {"asset": "P-101", "point": "P-101/M-DE/H", "speed_rpm": 1482, **common},
        "acceleration [g]",
        [f"{a:.6f}" for a in sound],
    )
    loose = machine(24.76, 25, 300, 0.02, 2, blades=6)
    write(
        "P-201_P-NDE_H.csv",
        {"asset": "P-201", "point": "P-201/P-NDE/H", "speed_rpm": 1486, **common},
        "acceleration [g]",
        [f"{a:.6f}" for a in loose],
    )
    # Decimal comma, semicolons, a time column: no rate is told, the time says it.
    comma = machine(24.7, 0, 25, 0.02, 3)
    write(
        "P-102_M-DE_H.csv",
        {"asset": "P-102", "point": "P-102/M-DE/H", "speed_rpm": "1482"},
        "time (s);acceleration (g)",
        [f"{n / RATE_HZ:.7f};{a:.6f}".replace(".", ",") for n, a in enumerate(comma)],
        line_end="\r\n",
    )
    write(
        "F-302_F-DE_H.csv",
        {"asset": "F-302", "point": "F-302/F-DE/H", "speed_rpm": 1478, **common},
        "velocity (mm/s)",
        [f"{v:.5f}" for v in to_velocity_mm_s(machine(24.63, 0, 45, 0.02, 4, blades=12))],
    )
    broken = [f"{a:.6f}" for a in machine(24.7, 0, 20, 0.02, 5)[:2000]]
    broken[1200] = "overflow"
    write(
        "P-101_P-DE_H.csv",
        {"asset": "P-101", "point": "P-101/P-DE/H", "speed_rpm": 1482, **common},
        "acceleration [g]",
        broken,
    )


if __name__ == "__main__":
    main()
