"""The page in Firefox ESR and in WebKitGTK: from the address to a curve, and nothing leaves afterwards."""

from __future__ import annotations

import json
import os
import re
import subprocess
from collections.abc import Callable, Iterator
from pathlib import Path

import pytest
from selenium import webdriver

from browsers import firefox, virtual_screen, webkit
from make_dist import DIST, WEB
from node import node_and_npm
from site_server import SiteServer

HERE = Path(__file__).parent
JOURNEY = (HERE / "journey.js").read_text(encoding="utf-8")
LIMIT_S = 240


def in_firefox(address: str, there: str) -> dict:
    """Carry out the journey in Firefox ESR."""
    node, _ = node_and_npm()
    command = [node, str(HERE / "firefox.mjs"), firefox(), str(WEB), address, there]
    done = subprocess.run(command, capture_output=True, text=True, timeout=LIMIT_S, check=False)
    assert done.returncode == 0, done.stderr
    return json.loads(done.stdout.splitlines()[-1])


def in_webkit(address: str, there: str) -> dict:
    """Carry out the journey in WebKitGTK's small browser, on a screen that only exists in memory."""
    driver, browser = webkit()
    options = webdriver.WebKitGTKOptions()
    options.binary_location = browser
    options.add_argument("--automation")
    with virtual_screen() as display:
        os.environ["DISPLAY"] = display
        if os.geteuid() == 0:
            os.environ["WEBKIT_DISABLE_SANDBOX_THIS_IS_DANGEROUS"] = "1"
        opened = webdriver.WebKitGTK(options=options, service=webdriver.WebKitGTKService(driver))
        try:
            opened.set_script_timeout(LIMIT_S)
            opened.get(address)
            asked = JOURNEY[JOURNEY.index("async (") :].strip()
            said = opened.execute_async_script(
                f"const done = arguments[1]; ({asked})(arguments[0]).then(done, (fault) => done({{ fault: String(fault) }}));",
                there,
            )
            assert "fault" not in said, said
            return said
        finally:
            opened.quit()


@pytest.fixture
def elsewhere(tmp_path: Path) -> Iterator[SiteServer]:
    server = SiteServer(tmp_path).start()
    yield server
    server.shutdown()


@pytest.mark.parametrize("carry_out", [in_firefox, in_webkit])
@pytest.mark.parametrize("form", ["site", "one-file copy"])
def test_to_the_first_curve_and_nothing_leaves(
    carry_out: Callable, form: str, site: SiteServer, elsewhere: SiteServer
) -> None:
    address = site.address if form == "site" else (DIST / "vitalroll.html").as_uri()
    said = carry_out(address, elsewhere.address)
    assert re.match(r"[\d,]+ ", said["register"])
    assert "%" in said["survival"]
    assert said["sealed"]
    assert said["compare"]
    assert elsewhere.requests == []
