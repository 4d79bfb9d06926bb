"""Every place, by keyboard, on a small screen, and for axe-core's rules of WCAG 2.2 AA."""

from __future__ import annotations

from collections.abc import Callable
from itertools import pairwise

import pytest
from playwright.sync_api import Page

from environment import HOUSE
from site_server import SiteServer

AXE = (HOUSE / "web" / "node_modules" / "axe-core" / "axe.min.js").read_text(encoding="utf-8")
RULES = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"]
PLACES = ["register", "outcomes", "compare", "caseload", "counts", "report"]
ANSWER_MS = 30_000


def with_demo(opened: Callable, site: SiteServer, **options: object) -> Page:
    """Open the page with the demo register, grouped, everything shown once."""
    page = opened(site.address, **options).page
    page.locator("#open-demo").click()
    page.locator("#place-register .next").wait_for(timeout=ANSWER_MS)
    show(page, "outcomes")
    page.locator("#outcomes-group").select_option(index=1)
    show(page, "counts")
    for part in ("lifeTable", "strata", "balance", "district"):
        page.locator(f"#{part}-example").click()
    show(page, "caseload")
    page.locator("#items-example").click()
    page.locator("#levers-example").click()
    for place in PLACES:
        show(page, place)
    return page


def show(page: Page, place: str) -> None:
    page.evaluate("place => { location.hash = place }", place)
    page.locator(f"#place-{place}").wait_for(state="visible")
    page.wait_for_function("() => !document.querySelector('[aria-busy=true]')", timeout=ANSWER_MS)
    page.wait_for_timeout(600)


@pytest.fixture(params=["en", "fr"])
def page(request: pytest.FixtureRequest, site: SiteServer, opened: Callable) -> Page:
    return with_demo(opened, site, language=request.param)


def test_axe_finds_nothing_serious_on_any_place(page: Page) -> None:
    page.evaluate(AXE)
    found = []
    for place in PLACES:
        show(page, place)
        result = page.evaluate("rules => axe.run(document, { runOnly: rules })", RULES)
        for violation in result["violations"]:
            if violation["impact"] in ("serious", "critical"):
                targets = [node["target"] for node in violation["nodes"][:3]]
                found.append((place, violation["id"], violation["help"], targets))
    assert not found


@pytest.mark.parametrize("width", [320, 360, 768])
def test_no_place_scrolls_sideways(site: SiteServer, opened: Callable, width: int) -> None:
    """Tables scroll within themselves; the page does not, down to 320 px (WCAG 1.4.10)."""
    page = with_demo(opened, site, width=width)
    wide = []
    for place in PLACES:
        show(page, place)
        if page.evaluate("() => document.documentElement.scrollWidth > innerWidth"):
            wide.append(place)
    assert not wide


def test_every_control_is_reached_by_tab_and_shows_its_focus(site: SiteServer, opened: Callable) -> None:
    page = with_demo(opened, site)
    show(page, "outcomes")
    page.evaluate("() => document.body.focus()")
    reached = set()
    for _ in range(200):
        page.keyboard.press("Tab")
        name, outline = page.evaluate(
            "() => (({ activeElement: here, body }) => here === body ? ['', 'none']"
            " : [here.id || here.textContent.slice(0, 40), getComputedStyle(here).outlineStyle])(document)"
        )
        reached.add(name)
        assert outline != "none" or not name, name
    wanted = page.evaluate(
        "() => [...document.querySelectorAll('#place-outcomes select, #place-outcomes input, #language')]"
        ".map((each) => each.id)"
    )
    assert set(wanted) <= reached


def test_an_answer_is_announced_and_headings_are_in_order(site: SiteServer, opened: Callable) -> None:
    page = with_demo(opened, site)
    show(page, "outcomes")
    assert page.locator("#survival .answer").get_attribute("aria-live") == "polite"
    levels = page.evaluate(
        "() => [...document.querySelectorAll('#place-outcomes :is(h1, h2, h3)')].map((h) => Number(h.tagName[1]))"
    )
    assert levels[0] == 1
    assert all(later - earlier <= 1 for earlier, later in pairwise(levels))
