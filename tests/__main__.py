"""The one check command, ``python -m tests``: lint, format, types, then every test.

Extra arguments go to pytest, for example ``python -m tests tests/core -k sag``.
"""

import subprocess
import sys

CHECKS = (
    ("lint", ["ruff", "check", "."]),
    ("format", ["ruff", "format", "--check", "."]),
    ("types", ["mypy"]),
    ("tests", ["pytest", *sys.argv[1:]]),
)


def main() -> int:
    """Run every check, even after one failed, and return the number of failures."""
    failed = []
    for name, command in CHECKS:
        print(f"== {name}: {' '.join(command)}", flush=True)
        if subprocess.run([sys.executable, "-m", *command], check=False).returncode:
            failed.append(name)
    if failed:
        print(f"Failed: {', '.join(failed)}", file=sys.stderr)
    return len(failed)


if __name__ == "__main__":
    sys.exit(main())
