"""Inside Pyodide: carry out every task once and tell which files that touched.

The folder /house holds the project's core and build_scripts.
"""

import sys
from pathlib import Path

SITE = Path("/lib/python3.14/site-packages")
ZIP = "/lib/python314.zip"

sys.path[:0] = ["/house/build_scripts"]
import exercise  # noqa: E402 - the path had to be set first

exercise.everything()

touched = sorted({getattr(module, "__file__", None) or "" for module in list(sys.modules.values())})
result = {
    "site": [str(Path(file).relative_to(SITE)) for file in touched if file.startswith(str(SITE))],
    "stdlib": [file[len(ZIP) + 1 :] for file in touched if file.startswith(ZIP)],
}
