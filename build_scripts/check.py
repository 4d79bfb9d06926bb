"""Set up, build and run every test: ``python3 build_scripts/check.py``."""

import argparse
import subprocess
import sys

import environment

ROOMS = ["unit", "hard_cases", "reference", "build", "wasm", "browser"]


def main():
    """Carry out the command."""
    asked = argparse.ArgumentParser(description="Set up, build and check Vitalroll.")
    asked.add_argument(
        "--only", choices=ROOMS, action="append", help="only these tests (may be given several times)"
    )
    options = asked.parse_args()
    environment.enter("check")

    from browsers import chromium, firefox, virtual_screen, webkit
    from make_dist import WEB, build
    from node import node_and_npm

    rooms = options.only or ROOMS
    if "browser" in rooms:
        # Found, or installed, or a plain word of what is missing, before anything takes long.
        chromium()
        firefox()
        webkit()
        with virtual_screen():
            pass
    build()
    node, _ = node_and_npm()
    steps = [
        ("Style of the Python", [sys.executable, "-m", "ruff", "check", "."]),
        (
            "Types of the page",
            [node, str(WEB / "node_modules" / "typescript" / "bin" / "tsc"), "-p", str(WEB)],
        ),
        ("Tests", [sys.executable, "-m", "pytest", *[f"tests/{room}" for room in rooms]]),
    ]
    failed = []
    for name, command in steps:
        print(f"== {name}", flush=True)
        if subprocess.run(command, cwd=str(environment.HOUSE)).returncode:
            failed.append(name)
    if failed:
        sys.exit(f"Failed: {', '.join(failed)}.")


if __name__ == "__main__":
    main()
