"""From any Python 3 to this project's own environment: a .venv with pinned packages.

This module is read by whatever ``python3`` a person has, so it keeps to syntax that Python 3.8
understands and to the standard library.
"""

import hashlib
import os
import shutil
import subprocess
import sys
from pathlib import Path

HOUSE = Path(__file__).resolve().parents[1]
VENV = HOUSE / ".venv"
OLDEST = (3, 12)
NEWEST_KNOWN = 20
STAMP = VENV / "pins.sha256"


def enter(group):
    """Make sure that this process runs in the project's environment; start again inside it if not.

    ``group`` is a name of ``[dependency-groups]`` in pyproject.toml. Returns only inside.
    """
    inside = Path(sys.prefix).resolve() == VENV.resolve()
    if not inside:
        if not _works(venv_python()):
            _make(find_python())
        os.execv(str(venv_python()), [str(venv_python()), *sys.argv])
    if not _ready(group):
        _install(group)
    # The engine is built from and checked against the checkout itself.
    sys.path.insert(1, str(HOUSE / "core"))


def venv_python():
    """Return the path of the environment's own interpreter."""
    return VENV / ("Scripts/python.exe" if os.name == "nt" else "bin/python")


def find_python():
    """Return a Python that is new enough: the running one, one on PATH, or one of pyenv's."""
    for candidate in _candidates():
        version = _version(candidate)
        if version and version[:2] >= OLDEST:
            return candidate
    sys.exit(
        "Python 3.12 or newer was not found: neither the Python that runs this, nor python3.12 and later\n"
        "on PATH, nor among pyenv's versions. Install one (on Debian 13: apt-get install python3\n"
        "python3-venv; elsewhere from python.org or with pyenv), then run the same command again."
    )


def _candidates():
    yield sys.executable
    for minor in range(NEWEST_KNOWN, OLDEST[1] - 1, -1):
        found = shutil.which("python3.%d" % minor)
        if found:
            yield found
    roots = [os.environ.get("PYENV_ROOT"), str(Path.home() / ".pyenv")]
    for root in [root for root in roots if root]:
        versions = Path(root) / "versions"
        if versions.is_dir():
            for folder in sorted(versions.iterdir(), reverse=True):
                yield str(folder / "bin" / "python3")


def _version(python):
    """Return (major, minor) of an interpreter that can make environments, or None."""
    asked = "import sys, venv, ensurepip; print(*sys.version_info[:2])"
    try:
        answer = subprocess.run(
            [python, "-c", asked], stdout=subprocess.PIPE, stderr=subprocess.DEVNULL, check=True
        )
        return tuple(int(part) for part in answer.stdout.split())
    except (OSError, subprocess.CalledProcessError, ValueError):
        return None


def _wanted(group):
    pins = (HOUSE / "pyproject.toml").read_bytes()
    return hashlib.sha256(pins + group.encode()).hexdigest()


def _ready(group):
    return STAMP.exists() and _wanted(group) in STAMP.read_text().split()


def _works(python):
    return python.exists() and _version(str(python)) is not None


def _make(python):
    print("Setting up the environment in .venv with %s …" % python, flush=True)
    if VENV.exists():
        shutil.rmtree(str(VENV))
    subprocess.run([python, "-m", "venv", str(VENV)], check=True)
    pip("install", "--upgrade", "pip>=25.1")


def _install(group):
    print("Installing the pinned packages of the group “%s” …" % group, flush=True)
    pip("install", "--group", "%s:%s" % (HOUSE / "pyproject.toml", group))
    stamps = STAMP.read_text().split() if STAMP.exists() else []
    STAMP.write_text("\n".join([*stamps, _wanted(group)]) + "\n")


def pip(*arguments):
    """Run the environment's pip; stop with its own words when it fails."""
    done = subprocess.run(
        [str(venv_python()), "-m", "pip", "--quiet", "--disable-pip-version-check", *arguments],
        cwd=str(HOUSE),
    )
    if done.returncode:
        sys.exit(
            "Installing failed (see above). Check the connection to your package index "
            "and run the same command again."
        )
