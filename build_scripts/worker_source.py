"""Pyodide's scripts and our worker code as one classic worker script.

A module worker cannot be started from a Blob under file:// in every browser, nor can a worker
there import() anything; a classic script that is all in one piece can. Pyodide's main module is
turned from an ES module into plain script: it needs ``import.meta.url`` only to find files that we
hand over ourselves, and its only export is given to ``self``.
"""

from __future__ import annotations

import sys
from pathlib import Path

from environment import HOUSE

OWN_WORKER = HOUSE / "web" / "scripts" / "engine" / "worker.js"
EXPORT = "export default _createPyodideModule;"


def worker_source(runtime: Path) -> str:
    """Return the source of the worker.

    Parameters
    ----------
    runtime : Path
        Folder of the npm package ``pyodide``.
    """
    module = (runtime / "pyodide.asm.mjs").read_text(encoding="utf-8")
    if module.count(EXPORT) != 1:
        sys.exit("Pyodide's main module no longer ends as worker_source expects; look at its exports.")
    module = module.replace(EXPORT, "self.createPyodideModule = _createPyodideModule;")
    module = module.replace("import.meta.url", '"https://pack.invalid/"')
    loader = (
        (runtime / "pyodide.js")
        .read_text(encoding="utf-8")
        .replace("//# sourceMappingURL=pyodide.js.map", "")
    )
    return "\n".join([module, loader, OWN_WORKER.read_text(encoding="utf-8")])
