"""From a checkout to dist/: the site, the one-file copy and the wheel."""

from __future__ import annotations

import hashlib
import os
import shutil
import subprocess
import sys
from pathlib import Path

from engine_pack import ENGINE_PACKAGES, RUNTIME, Member, engine_pack
from environment import HOUSE
from licences import collect
from node import install_page_packages, node_and_npm
from site_pages import bundle, write_one_file, write_site
from wheels import engine_wheels

WEB = HOUSE / "web"
DIST = HOUSE / "dist"
WORK = HOUSE / ".cache" / "build"
FIXED_TIME = "315532800"
"""1980-01-01, for SOURCE_DATE_EPOCH: two builds of one commit give the same bytes."""


def build(dist: Path = DIST) -> None:
    """Build everything into ``dist``, unless nothing it is made from has changed since."""
    node, npm = node_and_npm()
    install_page_packages(npm)
    stamp = dist / ".sources.sha256"
    sources = fingerprint_of_sources()
    if stamp.exists() and stamp.read_text() == sources:
        return
    shutil.rmtree(dist, ignore_errors=True)
    dist.mkdir(parents=True)
    print("Packing the engine …", flush=True)
    members = engine_pack(node, WORK / "engine")
    print("Bundling the page …", flush=True)
    page = bundle(_empty(WORK / "page"))
    licences = collect(engine_wheels(RUNTIME, ENGINE_PACKAGES))
    write_site(dist / "site", page, members, licences)
    write_one_file(dist / "vitalroll.html", page, members, licences)
    build_wheel(dist)
    stamp.write_text(sources)
    _say_sizes(members)


def build_wheel(dist: Path) -> None:
    """Build the pure-Python wheel."""
    source = _empty(WORK / "wheel")
    for name in ("pyproject.toml", "README.md"):
        shutil.copy(HOUSE / name, source / name)
    shutil.copytree(
        HOUSE / "core", source / "core", ignore=shutil.ignore_patterns("__pycache__", "*.egg-info")
    )
    subprocess.run(
        [sys.executable, "-m", "build", "--wheel", "--no-isolation", "--outdir", str(dist), str(source)],
        check=True,
        stdout=subprocess.DEVNULL,
        env={**os.environ, "SOURCE_DATE_EPOCH": FIXED_TIME},
    )


def fingerprint_of_sources() -> str:
    """Return one hash over every file that the build reads."""
    total = hashlib.sha256()
    files = [HOUSE / "pyproject.toml", HOUSE / "README.md"]
    for room in ("core", "web", "build_scripts"):
        files += [path for path in (HOUSE / room).rglob("*") if path.is_file() and not _made(path)]
    for path in sorted(files):
        total.update(str(path.relative_to(HOUSE)).encode())
        total.update(path.read_bytes())
    return total.hexdigest()


def _made(path: Path) -> bool:
    return any(part in ("node_modules", "__pycache__") or part.endswith(".egg-info") for part in path.parts)


def _empty(folder: Path) -> Path:
    shutil.rmtree(folder, ignore_errors=True)
    folder.mkdir(parents=True)
    return folder


def _say_sizes(members: list[Member]) -> None:
    total = sum(len(member.packed) for member in members)
    listed = ", ".join(f"{member.name} {len(member.packed) / 1e6:.2f}" for member in members)
    print(f"The engine pack: {total / 1e6:.1f} MB on the wire ({listed}).", flush=True)
