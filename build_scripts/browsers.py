"""Browsers for the tests: found, or installed from Debian's packages."""

from __future__ import annotations

import glob
import os
import shutil
import subprocess
import sys
from collections.abc import Iterator
from contextlib import contextmanager

CHROMIUM_NAMES = ("chromium", "chromium-browser", "google-chrome", "google-chrome-stable")
WEBKIT_BROWSERS = "/usr/lib/*/webkit2gtk-4.*/MiniBrowser"


def chromium() -> str:
    """Return the path of a Chromium; install Debian's when running as root without one."""
    return _found(CHROMIUM_NAMES) or _installed("chromium", CHROMIUM_NAMES)


def firefox() -> str:
    """Return the path of a Firefox; install Debian's long-term one when running as root without one."""
    names = ("firefox-esr", "firefox")
    return _found(names) or _installed("firefox-esr", names)


def webkit() -> tuple[str, str]:
    """Return the paths of WebKitGTK's driver and of its small browser, installed like the others."""
    names = ("WebKitWebDriver",)
    driver = _found(names) or _installed("webkit2gtk-driver", names)
    browser = next(iter(sorted(glob.glob(WEBKIT_BROWSERS), reverse=True)), None)
    if not browser:
        sys.exit(f"{driver} is there, but no {WEBKIT_BROWSERS} for it to drive.")
    return driver, browser


@contextmanager
def virtual_screen() -> Iterator[str]:
    """Give the name of a display that exists only in memory, for browsers that cannot do without one."""
    server = _found(("Xvfb",)) or _installed("xvfb", ("Xvfb",))
    reading, writing = os.pipe()
    command = [server, "-displayfd", str(writing), "-screen", "0", "1280x900x24", "-nolisten", "tcp"]
    running = subprocess.Popen(command, pass_fds=[writing], stderr=subprocess.DEVNULL)
    os.close(writing)
    try:
        with os.fdopen(reading) as answer:
            yield f":{answer.readline().strip()}"
    finally:
        running.terminate()
        running.wait()


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
