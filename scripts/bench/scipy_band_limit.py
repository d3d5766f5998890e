"""Times scipy.signal.sosfilt on the internal-rate samples that the strip benchmark gives it.

Usage: scipy_band_limit.py SAMPLES CHANNELS SECTIONS_JSON REPEATS
SAMPLES: little-endian float64, channel by channel. Prints {"medianMs": ...}.
"""

import json
import statistics
import sys
import time

import numpy as np
from scipy.signal import sosfilt

path, channels, sections, repeats = sys.argv[1], int(sys.argv[2]), sys.argv[3], int(sys.argv[4])
samples = np.fromfile(path, dtype="<f8").reshape(channels, -1)
sos = np.array(json.loads(sections))
times = []
for _ in range(repeats):
    started = time.perf_counter()
    sosfilt(sos, samples, axis=1)
    times.append((time.perf_counter() - started) * 1000)
print(json.dumps({"medianMs": statistics.median(times)}))
