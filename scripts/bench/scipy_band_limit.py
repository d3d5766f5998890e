"""Times SciPy's sosfilt on the work that the recorder does, for comparison.

Usage: scipy_band_limit.py SAMPLES SECTIONS [--repeat N] [--channels N] [--decimation N]

SAMPLES   raw little-endian doubles, channel after channel, at the recorder's internal rate
SECTIONS  JSON: a list of second-order sections, each [b0, b1, b2, 1, a1, a2]

Filters all channels in one call of scipy.signal.sosfilt (along the last axis) and keeps one output in `--decimation`,
`--repeat` times after a first run that is not counted. Prints one line of JSON:
{"medianMs": ..., "minMs": ..., "channels": ..., "samples": ..., "sections": ..., "scipy": "..."}
"""

import argparse
import json
import statistics
import time

import numpy as np
import scipy
from scipy.signal import sosfilt


def main():
    parser = argparse.ArgumentParser(description=__doc__.splitlines()[0])
    parser.add_argument("samples")
    parser.add_argument("sections")
    parser.add_argument("--repeat", type=int, default=15)
    parser.add_argument("--channels", type=int, default=8)
    parser.add_argument("--decimation", type=int, default=16)
    options = parser.parse_args()

    flat = np.fromfile(options.samples, dtype="<f8")
    if flat.size == 0 or flat.size % options.channels:
        parser.error("%s does not hold %d channels of equal length" % (options.samples, options.channels))
    channels = flat.reshape(options.channels, -1)
    with open(options.sections) as file:
        sections = np.array(json.load(file), dtype=float)
    if sections.ndim != 2 or sections.shape[1] != 6:
        parser.error("%s does not hold a list of [b0, b1, b2, 1, a1, a2]" % options.sections)

    def run():
        started = time.perf_counter()
        np.ascontiguousarray(sosfilt(sections, channels)[:, :: options.decimation])
        return (time.perf_counter() - started) * 1000

    run()
    times = [run() for _ in range(max(1, options.repeat))]
    print(
        json.dumps(
            {
                "medianMs": statistics.median(times),
                "minMs": min(times),
                "channels": int(channels.shape[0]),
                "samples": int(channels.shape[1]),
                "sections": int(sections.shape[0]),
                "scipy": scipy.__version__,
            }
        )
    )


if __name__ == "__main__":
    main()
