"""The build's own promises about what it leaves in dist/."""

from __future__ import annotations

import base64
import gzip
import hashlib
import html
import json
import re
import subprocess
import sys
import venv
import zipfile
from pathlib import Path

import pytest

from engine_pack import ENGINE_PACKAGES, RUNTIME, engine_pack
from environment import HOUSE
from licences import collect
from make_dist import DIST, build_wheel
from node import node_and_npm
from site_pages import bundle, write_one_file, write_site
from wheels import cache_folder, engine_wheels

SITE = DIST / "site"
MOST_ON_THE_WIRE = 20_000_000


@pytest.fixture(scope="module")
def manifest() -> dict:
    page = (SITE / "index.html").read_text(encoding="utf-8")
    return json.loads(re.search(r'id="pack">(.*?)</script>', page, re.DOTALL)[1])


def test_everything_for_the_first_curve_is_small_enough() -> None:
    """Twenty megabytes on the wire for the whole page, whatever the host compresses or not."""
    everything = sum(
        path.stat().st_size for path in SITE.rglob("*") if path.is_file() and path.name != "licences.txt"
    )
    assert everything <= MOST_ON_THE_WIRE


def test_every_member_is_what_the_manifest_says(manifest: dict) -> None:
    assert {member["name"] for member in manifest["members"]} == {
        "worker",
        "wasm",
        "lock",
        "stdlib",
        "engine",
        "demo",
    }
    for member in manifest["members"]:
        packed = (SITE / member["file"]).read_bytes()
        digest = hashlib.sha256(packed).digest()
        assert member["integrity"] == "sha256-" + base64.b64encode(digest).decode()
        assert member["file"] == f"assets/{member['name']}-{digest.hex()[:12]}.gz"
        assert len(packed) == member["bytes"]
        assert len(gzip.decompress(packed)) == member["size"]


def test_only_the_front_page_and_the_licences_have_fixed_names() -> None:
    names = {str(path.relative_to(SITE)) for path in SITE.rglob("*") if path.is_file()}
    fixed = {name for name in names if not re.fullmatch(r"assets/[a-z]+-[0-9a-f]{12}\.(gz|js|css)", name)}
    assert fixed == {"index.html", "licences.txt"}


def test_the_page_names_no_outside_address() -> None:
    """Namespaces of XML are names, not addresses; this machine's own address is asked to see the seal refuse."""
    for path in [SITE / "index.html", *SITE.glob("assets/*.js"), *SITE.glob("assets/*.css")]:
        text = path.read_text(encoding="utf-8")
        hosts = set(re.findall(r"(?:https?|wss?)://([\w.-]+)", text))
        assert hosts <= {"www.w3.org", "127.0.0.1"}, path.name


def test_the_template_is_filled_and_the_policy_comes_first() -> None:
    page = (SITE / "index.html").read_text(encoding="utf-8")
    assert "<!-- build:" not in page
    assert page.index("Content-Security-Policy") < page.index("<script")
    assert page.index("Content-Security-Policy") < page.index("<link")


def test_the_one_file_copy_refers_to_no_other_file() -> None:
    page = (DIST / "vitalroll.html").read_text(encoding="utf-8")
    assert not re.findall(r'<(?:script|img|iframe)[^>]* src="|<link[^>]* href="(?!data:)', page)
    assert "connect-src 'none'" in html.unescape(page[:3000])


@pytest.mark.parametrize(
    "name", ["pyodide", "numpy", "scipy", "openpyxl", "@observablehq/plot", "@fluent/bundle", "d3"]
)
def test_the_licences_of_what_is_inside_are_there(name: str) -> None:
    parts = (SITE / "licences.txt").read_text(encoding="utf-8").split("=" * 100)
    mine = [part for part in parts if part.strip().startswith(f"{name} ")]
    assert mine
    assert all(len(part) > 200 for part in mine)


def test_the_build_holds_no_path_of_this_machine(manifest: dict) -> None:
    # Pyodide's own files name folders of the machine that Pyodide was built on; ours must not.
    here = [str(HOUSE).encode(), str(cache_folder()).encode(), sys.prefix.encode()]
    contents = [path.read_bytes() for path in SITE.rglob("*") if path.is_file()]
    contents += [gzip.decompress((SITE / member["file"]).read_bytes()) for member in manifest["members"]]
    for content in contents:
        assert not any(path in content for path in here)


def test_the_wheel_installs_and_is_pure_python(tmp_path: Path) -> None:
    """It is installed into an environment of its own that sees only this one's numpy and scipy."""
    wheel = next(DIST.glob("vitalroll-*.whl"))
    assert wheel.name.endswith("-py3-none-any.whl")
    assert not [
        name for name in zipfile.ZipFile(wheel).namelist() if name.startswith(("tests", "build_scripts"))
    ]
    venv.create(tmp_path / "env", with_pip=True)
    python = tmp_path / "env" / "bin" / "python"
    subprocess.run([python, "-m", "pip", "install", "-q", "--no-deps", "--no-index", wheel], check=True)
    libraries = next(path for path in sys.path if path.endswith("site-packages"))
    asked = "import vitalroll.desk as d; print(d.__file__, d.answer('about', {})['answer']['version'])"
    said = subprocess.run(
        [python, "-c", asked],
        env={"PYTHONPATH": libraries},
        cwd=tmp_path,
        capture_output=True,
        text=True,
        check=True,
    ).stdout
    assert str(tmp_path) in said


def test_two_builds_give_the_same_bytes(tmp_path: Path) -> None:
    """Everything is made a second time, in another folder, and compared with dist/."""
    node, _ = node_and_npm()
    members = engine_pack(node, tmp_path / "engine")
    (tmp_path / "page").mkdir()
    page = bundle(tmp_path / "page")
    licences = collect(engine_wheels(RUNTIME, ENGINE_PACKAGES))
    again = tmp_path / "dist"
    write_site(again / "site", page, members, licences)
    write_one_file(again / "vitalroll.html", page, members, licences)
    build_wheel(again)
    made = sorted(path for path in again.rglob("*") if path.is_file())
    assert [str(path.relative_to(again)) for path in made] == sorted(
        str(path.relative_to(DIST))
        for path in DIST.rglob("*")
        if path.is_file() and path.name != ".sources.sha256"
    )
    for path in made:
        assert path.read_bytes() == (DIST / path.relative_to(again)).read_bytes(), path.name
