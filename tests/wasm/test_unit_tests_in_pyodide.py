"""The engine's unit tests pass inside Pyodide too, on its own Python, numpy and scipy."""

from __future__ import annotations

import json
import zipfile
from importlib.metadata import files
from pathlib import Path

from engine_pack import ENGINE_PACKAGES, RUNTIME, SITE, run_in_pyodide
from environment import HOUSE
from node import node_and_npm
from wheels import engine_wheels

TEST_PACKAGES = ["hypothesis", "iniconfig", "packaging", "pluggy", "pygments", "pytest", "sortedcontainers"]
"""What the unit tests import beside the engine, taken from this environment: all of it is pure Python."""


def test_unit_tests_pass_in_webassembly(tmp_path: Path) -> None:
    node, _ = node_and_npm()
    archives = [*engine_wheels(RUNTIME, ENGINE_PACKAGES), _test_packages(tmp_path / "tests.zip")]
    result = run_in_pyodide(
        node,
        tmp_path,
        Path(__file__).with_name("run_unit_tests.py"),
        archives=[{"path": str(path), "into": SITE} for path in archives],
        mounts={"/house": str(HOUSE)},
    )
    print(json.dumps(result))
    assert result["exit"] == 0
    assert result["passed"] > 100
    assert result["failed"] == result["skipped"] == 0


def _test_packages(path: Path) -> Path:
    with zipfile.ZipFile(path, "w", zipfile.ZIP_DEFLATED) as archive:
        for package in TEST_PACKAGES:
            for file in files(package) or []:
                if ".." not in file.parts and "__pycache__" not in file.parts:
                    archive.write(str(file.locate()), str(file))
    return path
