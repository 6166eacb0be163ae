#!/usr/bin/python3
"""Runs a command and prints its wall seconds, processor seconds and peak memory in MB.

  timed.py COMMAND [ARGUMENT...]

The command's own output goes to stderr; its exit code is kept.
"""
import resource
import subprocess
import sys
import time


def main(command):
    start = time.monotonic()
    code = subprocess.run(command, stdout=sys.stderr).returncode
    wall = time.monotonic() - start
    used = resource.getrusage(resource.RUSAGE_CHILDREN)
    print("%.3f %.3f %.0f" % (wall, used.ru_utime + used.ru_stime, used.ru_maxrss / 1024))
    return code


if __name__ == "__main__":
    if len(sys.argv) < 2:
        sys.exit(__doc__)
    sys.exit(main(sys.argv[1:]))
