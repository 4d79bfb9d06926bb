"""Lets the tests of this folder import what they share, ``register_cases``.

Test modules are imported by path, so that their folder is not where Python looks by itself.
"""

import sys
from pathlib import Path

sys.path.insert(0, str(Path(__file__).parent))
