#!/usr/bin/env python3
"""Times the whole tool against another program that does the same job, in turn, in one run.

    compare-speed.py --other 'PROGRAM {takes} {out}' --takes FOLDER [--runs 3] [--workers 2] [--config-extra FILE]

PROGRAM is any command line that cleans the takes of a folder into another; {takes} and {out} are put in. Build first:
dotnet build -c Release. Prints wall seconds, CPU seconds and the peak memory of the largest process, the median of the runs,
and the ratios. Plain Python 3.
"""
import argparse
import os
import resource
import shlex
import shutil
import statistics
import subprocess
import sys
import tempfile
import time
from pathlib import Path

ROOT = Path(__file__).resolve().parent.parent
TOOL = ROOT / "artifacts/bin/MocapClean.Cli/release/mocapclean"
LIKE_FOR_LIKE = "smooth: { method: butterworth, cutoff: 6 Hz }\nfill: slerp\n"


def timed(command):
    """Wall seconds, CPU seconds with all children, peak MiB of the largest process."""
    start = time.perf_counter()
    before = resource.getrusage(resource.RUSAGE_CHILDREN)
    done = subprocess.run(["/usr/bin/env", "python3", "-c", RUNNER, *command], capture_output=True, text=True)
    wall = time.perf_counter() - start
    after = resource.getrusage(resource.RUSAGE_CHILDREN)
    if done.returncode:
        sys.exit(f"{' '.join(command)}: exit {done.returncode}\n{done.stdout}{done.stderr}")
    cpu = after.ru_utime + after.ru_stime - before.ru_utime - before.ru_stime
    return wall, cpu, int(done.stdout.split()[-1]) / 1024


# A child of its own for each run, so that the peak is this run's and not the largest so far.
RUNNER = """
import resource, subprocess, sys
code = subprocess.run(sys.argv[1:], stdout=subprocess.DEVNULL).returncode
print(resource.getrusage(resource.RUSAGE_CHILDREN).ru_maxrss)
sys.exit(code)
"""


def main():
    p = argparse.ArgumentParser(description=__doc__, formatter_class=argparse.RawDescriptionHelpFormatter)
    p.add_argument("--other", required=True)
    p.add_argument("--takes", required=True, type=Path)
    p.add_argument("--runs", type=int, default=3)
    p.add_argument("--workers", type=int, default=2)
    a = p.parse_args()
    rows = {"other": [], "like for like": [], "defaults": []}
    with tempfile.TemporaryDirectory() as work:
        configs = {"like for like": LIKE_FOR_LIKE, "defaults": ""}
        for name, extra in configs.items():
            path = Path(work) / f"{name.replace(' ', '-')}.yaml"
            path.write_text(f"ingest: {{ takes: \"{a.takes.resolve()}/take_*.csv\" }}\noutput: {{ folder: \"{work}/out\" }}\n{extra}")
            configs[name] = [str(TOOL), "run", str(path), "--workers", str(a.workers), "--quiet"]
        for _ in range(a.runs):
            for name in rows:
                out = Path(work) / "out"
                shutil.rmtree(out, ignore_errors=True)
                if name == "other":
                    command = [w.format(takes=a.takes.resolve(), out=out) for w in shlex.split(a.other)]
                else:
                    command = configs[name]
                rows[name].append(timed(command))
    middle = {name: [statistics.median(r[i] for r in runs) for i in range(3)] for name, runs in rows.items()}
    print(f"{'':14} {'wall s':>8} {'CPU s':>8} {'peak MiB':>9} {'times as fast by wall':>22} {'by CPU':>7}   ({os.cpu_count()} cores, {a.runs} runs)")
    for name, (wall, cpu, peak) in middle.items():
        print(f"{name:14} {wall:8.2f} {cpu:8.2f} {peak:9.0f} {middle['other'][0] / wall:22.1f} {middle['other'][1] / cpu:7.1f}")


if __name__ == "__main__":
    main()
