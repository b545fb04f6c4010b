#!/usr/bin/python3
"""The figure of five specimens by matplotlib in a warm process: median processor milliseconds for a PNG of 960x640.

Needs Debian's python3-matplotlib. Called by tests/figure-costs.
"""

import io
import statistics
import time

import matplotlib

matplotlib.use("Agg")
import matplotlib.pyplot as plot


def peaked(w: float) -> float:
    return 1.826 - 0.0063 * (w - 14.1) ** 2


def draw() -> bytes:
    figure, axes = plot.subplots(figsize=(10, 20 / 3), dpi=96)
    waters = [9.8 + 7.5 * i / 65 for i in range(66)]
    axes.fill_between(waters, [peaked(w) - 0.02 for w in waters], [peaked(w) + 0.02 for w in waters], alpha=1 / 7)
    axes.plot(waters, [peaked(w) for w in waters])
    for name, saturation in (("zero air voids", 1), ("saturation 90 %", 0.9), ("saturation 80 %", 0.8)):
        densities = [2.68 * 0.9982 / (1 + w * 2.68 / saturation / 100) for w in waters]
        axes.plot(waters, densities, "--", linewidth=1)
        axes.text(waters[30], densities[30], name, rotation=-40)
    specimens = ((9.8, 1.712), (11.7, 1.782), (13.2, 1.826), (15.4, 1.811), (17.3, 1.757))
    axes.plot([w for w, _ in specimens], [density for _, density in specimens], "o", color="black")
    for i, (w, density) in enumerate(specimens):
        axes.annotate(str(i + 1), (w, density), xytext=(6, 4), textcoords="offset points")
    axes.plot([9, 14.1, 14.1], [1.826, 1.826, 1.69], linewidth=1)
    axes.plot(14.1, 1.826, "x")
    axes.set(xlim=(9, 18), ylim=(1.69, 1.86), xlabel="Water content (%)", ylabel="Dry density (Mg/m³)", title="Maximum dry density 1.83 Mg/m³ at 14.1 % water")
    axes.grid(linewidth=0.5)
    png = io.BytesIO()
    figure.savefig(png, format="png")
    plot.close(figure)
    return png.getvalue()


for _ in range(5):
    draw()
times = []
for _ in range(25):
    start = time.process_time()
    size = len(draw())
    times.append(1000 * (time.process_time() - start))
print(f"matplotlib {matplotlib.__version__}, PNG 960x640, warm: {statistics.median(times):.1f} ms, {size} bytes")
