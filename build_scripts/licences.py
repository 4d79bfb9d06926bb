"""The licences of everything that is inside the build, gathered from the packages themselves."""

from __future__ import annotations

import json
import zipfile
from pathlib import Path

from environment import HOUSE

MODULES = HOUSE / "web" / "node_modules"
LICENCE_NAMES = ("LICENSE", "LICENCE", "COPYING", "NOTICE")
RULE = "=" * 100
WITHOUT_TEXT = {
    "pyodide": "Mozilla Public License 2.0. Source: the npm package pyodide and its repository. It contains\n"
    "CPython (Python Software Foundation License 2.0) and Emscripten's libraries (MIT and University of\n"
    "Illinois/NCSA).",
}
"""What to say of a package that carries no licence file of its own."""

SAME_TEXT = {"Apache-2.0": MODULES / "typescript" / "LICENSE.txt"}
"""Where the text of a licence stands that a package names without carrying it."""


def collect(wheels: list[Path]) -> str:
    """Return one text with the licences of the page's packages and of the engine's wheels."""
    parts = [_npm_part(folder) for folder in _bundled_modules()]
    parts += [_wheel_part(wheel) for wheel in sorted(wheels)]
    return f"\n\n{RULE}\n".join(["Software inside Vitalroll, and its licences", *parts]) + "\n"


def _bundled_modules() -> list[Path]:
    """Return the folders of the page's dependencies and all that they depend on."""
    lock = json.loads((HOUSE / "web" / "package-lock.json").read_text(encoding="utf-8"))
    names = [name for name, about in lock["packages"].items() if name and not about.get("dev")]
    return sorted(HOUSE / "web" / name for name in names)


def _npm_part(folder: Path) -> str:
    about = json.loads((folder / "package.json").read_text(encoding="utf-8"))
    texts = [path.read_text(encoding="utf-8") for path in sorted(folder.iterdir()) if _is_licence(path.name)]
    if not texts and about["name"] in WITHOUT_TEXT:
        texts = [WITHOUT_TEXT[about["name"]]]
    if not texts and about.get("license") in SAME_TEXT:
        texts = [SAME_TEXT[about["license"]].read_text(encoding="utf-8")]
    return _part(about["name"], about["version"], about.get("license", ""), texts)


def _wheel_part(wheel: Path) -> str:
    name, version = wheel.name.split("-")[:2]
    with zipfile.ZipFile(wheel) as archive:
        texts = [
            archive.read(file).decode("utf-8", "replace")
            for file in sorted(archive.namelist())
            if ".dist-info/" in file and _is_licence(Path(file).name)
        ]
    return _part(name, version, "", texts)


def _is_licence(name: str) -> bool:
    return name.upper().startswith(LICENCE_NAMES)


def _part(name: str, version: str, licence: str, texts: list[str]) -> str:
    head = f"{name} {version}" + (f" ({licence})" if licence else "")
    return "\n\n".join([head, *(text.strip() for text in texts)])
