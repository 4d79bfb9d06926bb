"""Inside Pyodide: run the unit tests of the checkout at /house and count what came of them."""

import os
import sys
from collections import Counter

import pytest

os.chdir("/house")
sys.dont_write_bytecode = True
sys.path[:0] = ["/house/core", "/house/build_scripts"]


class Tally:
    """Counts the outcome of every test."""

    def __init__(self) -> None:
        self.outcomes = Counter()

    def pytest_runtest_logreport(self, report: pytest.TestReport) -> None:
        """Count a test once: when it was called, or when its set-up failed or skipped it."""
        if report.when == "call" or report.outcome != "passed":
            self.outcomes[report.outcome] += 1


tally = Tally()
arguments = [
    "tests/unit",
    "-q",
    "-p",
    "no:cacheprovider",
    "-p",
    "no:faulthandler",
    "--capture=no",
    "--no-header",
]
code = pytest.main(arguments, plugins=[tally])
result = {"exit": int(code), **{name: tally.outcomes[name] for name in ("passed", "failed", "skipped")}}
