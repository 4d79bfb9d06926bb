"""Rates on the page beside the native engine, in every time scale."""

from __future__ import annotations

from collections.abc import Callable

import pytest
from page_reading import ANSWER_MS, DEATHS, GROUP, go, numbers, table_rows

from site_server import SiteServer


def test_rates_by_year_duration_and_age(site: SiteServer, opened: Callable, native: Callable) -> None:
    page = opened(site.address).page
    page.locator("#open-demo").click()
    page.get_by_text("person-years.").first.wait_for(timeout=ANSWER_MS)
    go(page, "Outcomes")
    page.locator("#outcomes-group").select_option(label=GROUP)
    page.locator("#rates .sentence").nth(2).wait_for(timeout=ANSWER_MS)
    for by, first_band in (("year", "2016"), ("since_start", "0 to 1"), ("age", "5 to 15")):
        page.locator("#rates-by").select_option(by)
        expected = native("outcomes.rates", {"interest": DEATHS, "group": native.group, "by": by})
        page.locator("#rates").get_by_text(first_band, exact=True).first.wait_for(
            state="attached", timeout=ANSWER_MS
        )
        page.locator("#rates details summary").click()
        rows = table_rows(page, "Outcomes for each 100 person-years")
        lived = [
            (group["level"], band)
            for group in expected["groups"]
            for band in group["bands"]
            if band["person_years"] > 0
        ]
        assert len(rows) == len(lived)
        for row, (level, band) in zip(rows, lived, strict=True):
            assert row[0] == level
            assert numbers(row[2])[0] == band["events"]
            assert numbers(row[4])[0] == pytest.approx(100 * band["rate"]["value"], abs=0.0051)
    sentences = page.locator("#rates .sentence").all_inner_texts()
    ratio = expected["groups"][1]["ratio"]["value"]
    assert ratio == pytest.approx(numbers(sentences[1])[-3], rel=0.006)


def test_average_time_and_what_lies_ahead(site: SiteServer, opened: Callable, native: Callable) -> None:
    page = opened(site.address).page
    page.locator("#open-demo").click()
    page.get_by_text("person-years.").first.wait_for(timeout=ANSWER_MS)
    go(page, "Outcomes")
    page.locator("#outcomes-group").select_option(label=GROUP)
    page.locator("#mean-time-horizon").fill("4")
    page.locator("#mean-time-horizon").press("Tab")
    page.locator("#mean-time .sentence", has_text="within 4 years").nth(2).wait_for(timeout=ANSWER_MS)
    expected = native("outcomes.mean_time", {"interest": DEATHS, "group": native.group, "horizon_years": 4})
    rows = table_rows(page, "Averages within 4 years")
    for row, group in zip(rows, expected["groups"], strict=True):
        assert row[0] == group["level"]
        assert numbers(row[1])[0] == pytest.approx(group["mean"]["mean"]["value"], abs=0.0051)
    ahead = [each for group in expected["groups"] for each in group["ahead"]]
    for row, each in zip(table_rows(page, "Alive 2 years later"), ahead, strict=True):
        assert numbers(row[2])[0] == each["at_risk"]
        if each["code"] is None:
            assert numbers(row[3])[0] == pytest.approx(100 * each["estimate"]["value"], abs=0.051)
    page.locator("#mean-time-horizon").fill("40")
    page.locator("#mean-time-horizon").press("Tab")
    page.locator("#mean-time .refusal").wait_for(timeout=ANSWER_MS)
    assert "shortest ends after" in page.locator("#mean-time .refusal").inner_text()


def test_what_the_losses_could_change(site: SiteServer, opened: Callable, native: Callable) -> None:
    page = opened(site.address).page
    page.locator("#open-demo").click()
    page.get_by_text("person-years.").first.wait_for(timeout=ANSWER_MS)
    go(page, "Outcomes")
    page.locator("#outcomes-group").select_option(label=GROUP)
    page.locator("#tipping .sentence").nth(2).wait_for(timeout=ANSWER_MS)
    expected = native("outcomes.tipping", {"interest": DEATHS, "group": native.group})
    page.locator("#tipping details summary").click()
    rows = table_rows(page, "by the hazard of the lost")
    for i, row in enumerate(rows):
        for cell, group in zip(row[1:], expected["groups"], strict=True):
            estimate = group["survival"][i]
            wanted = [100 * estimate[name] for name in ("value", "lower", "upper")]
            assert numbers(cell) == pytest.approx(wanted, abs=0.051)
