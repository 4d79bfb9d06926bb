"""The built site in Debian's Chromium, driven by Playwright."""

from __future__ import annotations

import os
from collections.abc import Callable, Iterator
from dataclasses import dataclass, field

import pytest
from playwright.sync_api import Browser, Page, sync_playwright

from browsers import chromium
from demo_register import demo_register
from exercise import BY_HEADING, CLOSING, proposed_reading
from make_dist import DIST
from site_server import SiteServer
from vitalroll.desk import Desk

START_MS = 90_000
"""A slow machine may take long to start the engine; this only ends what hangs."""

EXPECTED_CONSOLE = ("Content Security Policy", "Refused to connect", "violates the document's")
"""The page proves its seal by being refused; the browser writes that down. Nothing else may be written."""


@pytest.fixture(scope="session")
def site() -> Iterator[SiteServer]:
    server = SiteServer(DIST / "site").start()
    yield server
    server.shutdown()


@pytest.fixture(scope="session")
def browser() -> Iterator[Browser]:
    arguments = ["--disable-background-networking", "--disable-component-update", "--disable-sync"]
    if os.geteuid() == 0:
        arguments.append("--no-sandbox")
    with sync_playwright() as playwright:
        launched = playwright.chromium.launch(executable_path=chromium(), args=arguments)
        yield launched
        launched.close()


@dataclass
class Watched:
    """A page with everything it complained of."""

    page: Page
    complaints: list[str] = field(default_factory=list)

    def wait_for_engine(self) -> None:
        """Wait until the page is sealed and its engine answers."""
        self.page.locator("#engine-progress").wait_for(state="detached", timeout=START_MS)
        assert self.page.locator("#engine-state .sealed").count() == 1


@pytest.fixture
def opened(browser: Browser) -> Iterator[Callable[..., Watched]]:
    """Open pages; at the end of the test none of them may have complained."""
    pages: list[Watched] = []

    def open_page(
        address: str, *, width: int = 1280, language: str = "en", ready: bool = True, **options: object
    ) -> Watched:
        context = browser.new_context(
            viewport={"width": width, "height": 900}, locale=language, accept_downloads=True, **options
        )
        watched = Watched(context.new_page())
        pages.append(watched)
        watched.page.on("pageerror", lambda fault: watched.complaints.append(str(fault)))
        watched.page.on("console", lambda message: _note(watched, message))
        watched.page.goto(address)
        if ready:
            watched.wait_for_engine()
        return watched

    yield open_page
    for watched in pages:
        watched.page.context.close()
        assert not watched.complaints


def _note(watched: Watched, message: object) -> None:
    if message.type in ("error", "warning") and not any(known in message.text for known in EXPECTED_CONSOLE):
        watched.complaints.append(message.text)


@pytest.fixture(scope="session")
def native() -> Callable[[str, dict], dict]:
    """The engine outside the browser, with the demo register read as the page proposes to read it."""
    desk = Desk()

    def ask(task: str, request: dict) -> dict:
        said = desk.answer(task, request)
        assert "answer" in said, said
        return said["answer"]

    source = ask("register.open", {"name": "demo-register.csv", "content": demo_register().encode()})
    reading = proposed_reading(lambda task, **request: ask(task, request), source, CLOSING)
    cohort = ask("register.build", reading)
    ask.cohort = cohort
    ask.group = next(each["id"] for each in cohort["covariates"] if each["heading"] == BY_HEADING)
    return ask
