"""Inside Pyodide: compile sources to bytecode with Pyodide's own Python.

Every .py file under /sources becomes a .pyc of the same name under /bytecode, with the hash of
its source inside and nothing that depends on the clock or on where it was compiled.
"""

import py_compile
from pathlib import Path

SOURCES = Path("/sources")
BYTECODE = Path("/bytecode")

count = 0
for source in sorted(SOURCES.rglob("*.py")):
    name = source.relative_to(SOURCES)
    target = BYTECODE / name.with_suffix(".pyc")
    target.parent.mkdir(parents=True, exist_ok=True)
    py_compile.compile(
        str(source),
        cfile=str(target),
        dfile=str(name),
        doraise=True,
        optimize=2,
        invalidation_mode=py_compile.PycInvalidationMode.UNCHECKED_HASH,
    )
    count += 1
result = {"compiled": count}
