"""The engine pack: Pyodide's runtime and exactly the files that the engine touches, as gzip members.

What is kept is found by carrying out every task of the desk once inside Pyodide (``exercise``)
and looking at which files were read. What is kept is compiled by Pyodide's own Python, since the
host's Python makes other bytecode.
"""

from __future__ import annotations

import base64
import gzip
import hashlib
import json
import shutil
import subprocess
import zipfile
from dataclasses import dataclass
from pathlib import Path

import vitalroll
from demo_register import demo_register
from environment import HOUSE
from wheels import engine_wheels
from worker_source import worker_source

RUNTIME = HOUSE / "web" / "node_modules" / "pyodide"
SCRIPTS = HOUSE / "build_scripts"
ENGINE_PACKAGES = ["numpy", "scipy"]
SITE = "/lib/python3.14/site-packages"
EARLIEST = (1980, 1, 1, 0, 0, 0)
"""The date in every archive, so that two builds give the same bytes."""

NEEDED_BY_NAME = ["encodings/"]
"""Parts of the standard library that are looked up by name at run time, beside those traced:
the encodings that a register can be written in."""


@dataclass(frozen=True)
class Member:
    """One file of the pack: what it is called, its bytes before packing, its packed bytes."""

    name: str
    content: bytes
    packed: bytes

    @property
    def file(self) -> str:
        """Return the name under which a host serves it: it changes with the content."""
        return f"assets/{self.name}-{hashlib.sha256(self.packed).hexdigest()[:12]}.gz"

    @property
    def integrity(self) -> str:
        """Return the value for ``integrity`` of a fetch."""
        return "sha256-" + base64.b64encode(hashlib.sha256(self.packed).digest()).decode()


def engine_pack(node: str, work: Path) -> list[Member]:
    """Make the members of the pack.

    Parameters
    ----------
    node : str
        Path of Node.
    work : Path
        A folder for what comes in between; emptied first.
    """
    shutil.rmtree(work, ignore_errors=True)
    work.mkdir(parents=True)
    wheels = engine_wheels(RUNTIME, ENGINE_PACKAGES)
    touched = _trace(node, work, wheels)
    site = _compiled(node, work / "site", _site_sources(wheels, touched["site"]))
    stdlib = _compiled(node, work / "stdlib", _stdlib_sources(touched["stdlib"]))
    members = [
        _member("worker", worker_source(RUNTIME).encode()),
        _member("wasm", (RUNTIME / "pyodide.asm.wasm").read_bytes()),
        _member("lock", _small_lock()),
        _member("stdlib", _stored_zip(stdlib)),
        _member("engine", _stored_zip(site)),
        _member("demo", demo_register().encode()),
    ]
    _prove(node, work, members)
    return members


def manifest(members: list[Member]) -> dict[str, object]:
    """Return what the page is told of the pack."""
    return {
        "version": vitalroll.__version__,
        "members": [
            {
                "name": member.name,
                "file": member.file,
                "bytes": len(member.packed),
                "size": len(member.content),
                "integrity": member.integrity,
            }
            for member in members
        ],
    }


def _member(name: str, content: bytes) -> Member:
    return Member(name, content, gzip.compress(content, compresslevel=9, mtime=0))


def run_in_pyodide(node: str, work: Path, script: Path, *, runtime: Path = RUNTIME, **job: object) -> dict:
    """Run a Python file inside Pyodide on Node and return its ``result``."""
    name = work / f"{script.stem}.json"
    full = {"runtime": str(runtime), "script": str(script), "archives": [], "mounts": {}} | job
    name.write_text(json.dumps(full))
    command = [node, str(SCRIPTS / "pyodide_on_node.mjs"), str(name)]
    done = subprocess.run(command, stdout=subprocess.PIPE, text=True, check=True)
    return json.loads(done.stdout.splitlines()[-1])


def _trace(node: str, work: Path, wheels: list[Path]) -> dict[str, list[str]]:
    core = work / "core.zip"
    core.write_bytes(_stored_zip(_core_sources()))
    return run_in_pyodide(
        node,
        work,
        SCRIPTS / "touched_files.py",
        archives=[{"path": str(path), "into": SITE} for path in [*wheels, core]],
        mounts={"/house/build_scripts": str(SCRIPTS)},
    )


def _prove(node: str, work: Path, members: list[Member]) -> None:
    """Carry out every task again with nothing but the pack."""
    packed = work / "packed"
    packed.mkdir()
    by_name = {member.name: member.content for member in members}
    for file in ("pyodide.mjs", "pyodide.asm.mjs"):
        shutil.copy(RUNTIME / file, packed / file)
    (packed / "pyodide.asm.wasm").write_bytes(by_name["wasm"])
    (packed / "python_stdlib.zip").write_bytes(by_name["stdlib"])
    (packed / "pyodide-lock.json").write_bytes(by_name["lock"])
    engine = work / "engine.zip"
    engine.write_bytes(by_name["engine"])
    run_in_pyodide(
        node,
        work,
        SCRIPTS / "touched_files.py",
        runtime=packed,
        archives=[{"path": str(engine), "into": SITE}],
        mounts={"/house/build_scripts": str(SCRIPTS)},
    )


def _core_sources() -> dict[str, bytes]:
    core = HOUSE / "core"
    files = [path for path in core.rglob("*") if path.is_file() and "__pycache__" not in path.parts]
    return {str(path.relative_to(core)): path.read_bytes() for path in sorted(files)}


def _site_sources(wheels: list[Path], touched: list[str]) -> dict[str, bytes]:
    """Return the touched files of the wheels, the libraries that those need, and all of the core."""
    found: dict[str, bytes] = {}
    wanted = set(touched)
    for wheel in wheels:
        with zipfile.ZipFile(wheel) as archive:
            for name in archive.namelist():
                if name in wanted or ".libs/" in name:
                    found[name] = archive.read(name)
    return found | _core_sources()


def _stdlib_sources(touched: list[str]) -> dict[str, bytes]:
    found: dict[str, bytes] = {}
    with zipfile.ZipFile(RUNTIME / "python_stdlib.zip") as archive:
        for name in archive.namelist():
            if name in touched or (name.endswith(".py") and name.startswith(tuple(NEEDED_BY_NAME))):
                found[name] = archive.read(name)
    return found


def _compiled(node: str, folder: Path, sources: dict[str, bytes]) -> dict[str, bytes]:
    """Return the same files with every .py replaced by its .pyc."""
    inside, outside = folder / "sources", folder / "bytecode"
    outside.mkdir(parents=True)
    for name, content in sources.items():
        target = inside / name
        target.parent.mkdir(parents=True, exist_ok=True)
        target.write_bytes(content)
    run_in_pyodide(
        node,
        folder,
        SCRIPTS / "compile_in_place.py",
        mounts={"/sources": str(inside), "/bytecode": str(outside)},
    )
    others = {name: content for name, content in sources.items() if not name.endswith(".py")}
    return others | {str(path.relative_to(outside)): path.read_bytes() for path in outside.rglob("*.pyc")}


def _small_lock() -> bytes:
    """Return Pyodide's lock file without any package: nothing is ever loaded by name."""
    lock = json.loads((RUNTIME / "pyodide-lock.json").read_text(encoding="utf-8"))
    lock["packages"] = {}
    return json.dumps(lock, sort_keys=True, separators=(",", ":")).encode()


def _stored_zip(files: dict[str, bytes]) -> bytes:
    """Return a zip without compression (the whole is packed as one) and without the clock."""
    import io

    buffer = io.BytesIO()
    with zipfile.ZipFile(buffer, "w", zipfile.ZIP_STORED) as archive:
        for name in sorted(files):
            archive.writestr(zipfile.ZipInfo(name, EARLIEST), files[name])
    return buffer.getvalue()
