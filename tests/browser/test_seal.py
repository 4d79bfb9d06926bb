"""After the seal no request of any kind leaves the page or its worker; the server sees nothing."""

from __future__ import annotations

import shutil
from collections.abc import Callable, Iterator
from pathlib import Path

import pytest

from make_dist import DIST
from site_server import SiteServer

PATIENCE_MS = 400

FROM_THE_PAGE = {
    "fetch": "fetch(there + 'fetch').catch(() => 0)",
    "xhr": "const x = new XMLHttpRequest(); x.open('GET', there + 'xhr'); x.send()",
    "beacon": "navigator.sendBeacon(there + 'beacon', 'x')",
    "websocket": "new WebSocket(there.replace('http', 'ws') + 'socket')",
    "event source": "new EventSource(there + 'events')",
    "image": "new Image().src = there + 'image.png'",
    "form": "const f = document.createElement('form'); f.action = there + 'form'; document.body.append(f); f.submit()",
    "frame": "const f = document.createElement('iframe'); f.src = there + 'frame'; document.body.append(f)",
    "script": "const s = document.createElement('script'); s.src = there + 'script.js'; document.head.append(s)",
    "module": "import(there + 'module.js').catch(() => 0)",
    "style": "const l = document.createElement('link'); l.rel = 'stylesheet'; l.href = there + 'a.css'; document.head.append(l)",
    "preload": "const l = document.createElement('link'); l.rel = 'preload'; l.as = 'fetch'; l.href = there + 'p'; document.head.append(l)",
    "prefetch": "const l = document.createElement('link'); l.rel = 'prefetch'; l.href = there + 'p2'; document.head.append(l)",
    "icon": "const l = document.createElement('link'); l.rel = 'icon'; l.href = there + 'i.png'; document.head.append(l)",
    "url in a style": "document.body.style.backgroundImage = `url(${there}background.png)`",
    "font": "new FontFace('x', `url(${there}font.woff2)`).load().catch(() => 0)",
    "media": "new Audio(there + 'a.mp3').play().catch(() => 0)",
    "object": "const o = document.createElement('object'); o.data = there + 'object'; document.body.append(o)",
    "worker": "new Worker(there + 'worker.js')",
    "worker from a blob": (
        "new Worker(URL.createObjectURL(new Blob([`fetch('${there}bf').catch(() => 0); "
        "try { importScripts('${there}bi.js') } catch {} import('${there}bm.js').catch(() => 0); "
        "const x = new XMLHttpRequest(); try { x.open('GET', '${there}bx', false); x.send() } catch {} "
        "try { new WebSocket('${there}'.replace('http', 'ws')) } catch {}`])))"
    ),
    "service worker": "navigator.serviceWorker?.register(there + 'sw.js').catch(() => 0)",
    "another window": "window.open(there + 'window')",
    "another address": "location.href = there + 'moved?data'",
    "a link": "const a = document.createElement('a'); a.href = there + 'link?data'; document.body.append(a); a.click()",
    "peer connection": "new RTCPeerConnection({ iceServers: [{ urls: 'stun:127.0.0.1:3478' }] })",
}
"""Each way a page can ask for something, as a statement in which `there` is an address."""


@pytest.fixture(scope="module")
def elsewhere(tmp_path_factory: pytest.TempPathFactory) -> Iterator[SiteServer]:
    """A second server, another origin than the page's."""
    server = SiteServer(tmp_path_factory.mktemp("elsewhere")).start()
    yield server
    server.shutdown()


@pytest.fixture(params=["site", "one-file copy"])
def sealed_page(request: pytest.FixtureRequest, site: SiteServer, opened: Callable):
    address = site.address if request.param == "site" else (DIST / "vitalroll.html").as_uri()
    watched = opened(address)
    yield watched
    # What was tried here was refused, and the browser complains of each; that is what is wanted.
    watched.complaints.clear()


def test_no_request_of_any_kind_reaches_a_server(
    sealed_page, site: SiteServer, elsewhere: SiteServer
) -> None:
    page = sealed_page.page
    site.requests.clear()
    for server in (site, elsewhere):
        for statement in FROM_THE_PAGE.values():
            _attempt(page, server.address, statement)
    page.wait_for_timeout(PATIENCE_MS)
    assert site.requests == []
    assert elsewhere.requests == []


def _attempt(page, there: str, statement: str) -> None:
    """Run a statement in the page. Playwright's own evaluation is not subject to the page's script policy."""
    page.evaluate(f"(there) => {{ try {{ {statement} }} catch {{}} }}", there)


def test_attempts_do_reach_a_server_before_the_seal(site: SiteServer, elsewhere: SiteServer, browser) -> None:
    """The listeners work: from an unsealed page the same statements are seen."""
    context = browser.new_context()
    page = context.new_page()
    page.goto(elsewhere.address)
    elsewhere.requests.clear()
    for name in ("fetch", "xhr", "beacon", "image", "script", "style", "worker from a blob"):
        _attempt(page, elsewhere.address, FROM_THE_PAGE[name])
    page.wait_for_timeout(PATIENCE_MS)
    asked = {path for _, path in elsewhere.requests}
    assert {"/fetch", "/xhr", "/beacon", "/image.png", "/script.js", "/a.css", "/bf"} <= asked
    context.close()


def test_the_page_proves_its_seal_and_says_so(site: SiteServer, opened: Callable) -> None:
    watched = opened(site.address)
    seal = watched.page.locator("#engine-state .sealed")
    assert "the browser now refuses" in seal.inner_text()
    seal.locator("summary").click()
    assert "refused 2" in seal.inner_text()
    assert not [path for _, path in site.requests if "seal-proof" in path]


def test_no_register_can_be_opened_before_the_seal(site: SiteServer, opened: Callable) -> None:
    """With the pack held back there is no seal, and the controls that open a register are off."""
    watched = opened("about:blank", ready=False)
    page = watched.page
    page.route("**/assets/wasm-*", lambda _: None)
    page.goto(site.address)
    page.get_by_text("Not sealed yet").wait_for()
    assert page.locator("#register-file").is_disabled()
    page.unroute_all(behavior="ignoreErrors")


def test_nothing_is_kept_in_the_browser(site: SiteServer, opened: Callable) -> None:
    page = opened(site.address).page
    kept = page.evaluate(
        "async () => [localStorage.length, sessionStorage.length, (await indexedDB.databases()).length, document.cookie]"
    )
    assert kept == [0, 0, 0, ""]


def test_a_damaged_member_is_refused_in_words(tmp_path: Path, opened: Callable) -> None:
    """One changed byte in the engine, and the page says that it will not use it."""
    copy = tmp_path / "site"
    shutil.copytree(DIST / "site", copy)
    member = next(copy.glob("assets/engine-*.gz"))
    content = bytearray(member.read_bytes())
    content[len(content) // 2] ^= 1
    member.write_bytes(content)
    server = SiteServer(copy).start()
    watched = opened(server.address, ready=False)
    watched.page.get_by_text("arrived damaged or changed").wait_for()
    watched.complaints.clear()
    server.shutdown()
