"""Browsers for the tests: found, or installed from Debian's packages."""

from __future__ import annotations

import os
import shutil
import subprocess
import sys

CHROMIUM_NAMES = ("chromium", "chromium-browser", "google-chrome", "google-chrome-stable")


def chromium() -> str:
    """Return the path of a Chromium; install Debian's when running as root without one."""
    return _found(CHROMIUM_NAMES) or _installed("chromium", CHROMIUM_NAMES)


def _found(names: tuple[str, ...]) -> str | None:
    return next((path for path in map(shutil.which, names) if path), None)


def _installed(package: str, names: tuple[str, ...]) -> str:
    apt = shutil.which("apt-get")
    if not apt or os.geteuid() != 0:
        sys.exit(
            f"The browser tests need {names[0]}, and none was found. "
            f"Install it (on Debian: apt-get install {package})."
        )
    print(f"Installing {package} …", flush=True)
    environment = {**os.environ, "DEBIAN_FRONTEND": "noninteractive"}
    for arguments in (["update", "-qq"], ["install", "-y", "-qq", "--no-install-recommends", package]):
        done = subprocess.run([apt, *arguments], env=environment, stdout=subprocess.DEVNULL)
        if done.returncode:
            sys.exit(f"apt-get {arguments[0]} failed (see above); the browser tests need {package}.")
    found = _found(names)
    if not found:
        sys.exit(f"{package} was installed, but none of {', '.join(names)} is on PATH.")
    return found
