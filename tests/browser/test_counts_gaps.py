"""Totals that are only half typed are never answered as if the rest did not exist."""

from __future__ import annotations

from collections.abc import Callable

from site_server import SiteServer


def test_an_open_interval_or_stratum_gives_no_answer(site: SiteServer, opened: Callable) -> None:
    page = opened(site.address + "#counts").page
    page.locator("#lifeTable-example").click()
    page.locator("#strata-example").click()
    page.locator("#counts-life-table .sentence").wait_for()
    page.locator("#counts-strata .sentence").wait_for()
    for field in ("#counts-intervals-1-events", "#counts-strata-grid-0-exposed_total"):
        page.locator(field).fill("")
        page.locator(field).press("Tab")
    page.locator("#counts-life-table .sentence").wait_for(state="detached")
    page.locator("#counts-strata .sentence").wait_for(state="detached")
