"""Rank tests on the page: within strata, along an order, by other weights, pair by pair."""

from __future__ import annotations

from collections.abc import Callable

import pytest
from page_reading import ANSWER_MS, DEATHS, GROUP, go, numbers, table_rows
from playwright.sync_api import Page, expect

from site_server import SiteServer


@pytest.fixture
def page(site: SiteServer, opened: Callable) -> Page:
    page = opened(site.address).page
    page.locator("#open-demo").click()
    page.get_by_text("person-years.").first.wait_for(timeout=ANSWER_MS)
    go(page, "Compare")
    page.locator("#compare-group").select_option(label=GROUP)
    page.locator("#rank-test .sentence").wait_for(timeout=ANSWER_MS)
    return page


def chi_squared(page: Page) -> float:
    return numbers(page.locator("#rank-test .sentence").inner_text())[0]


def test_choices_of_the_rank_test_give_what_the_native_engine_gives(page: Page, native: Callable) -> None:
    plain = native("compare.rank_test", {"interest": DEATHS, "group": native.group})
    assert chi_squared(page) == pytest.approx(plain["chi_squared"], abs=0.0051)
    rows = table_rows(page, "Each pair of groups by itself")
    assert [numbers(row[1])[0] for row in rows] == pytest.approx(
        [pair["chi_squared"] for pair in plain["pairs"]], abs=0.0051
    )
    assert len(rows) == 3

    page.locator("#compare-stratify").select_option(label="Sex")
    page.locator("#compare-ordered").select_option("yes")
    page.locator("#compare-score-2").fill("5")
    page.locator("#compare-score-2").press("Tab")
    page.locator("#compare-weight").select_option("fleming_harrington")
    page.locator("#compare-gamma").fill("1")
    page.locator("#compare-gamma").press("Tab")
    wanted = {
        "interest": DEATHS, "group": native.group, "stratify": "sex", "weight": "fleming_harrington", "rho": 1, "gamma": 1,
        "scores": {"Mild": 1, "Moderate": 2, "Severe": 5},
    }  # fmt: skip
    expected = native("compare.rank_test", wanted)
    expect(page.locator("#rank-test .method")).to_contain_text("(1 − S(t−))^1", timeout=ANSWER_MS)
    assert chi_squared(page) == pytest.approx(expected["chi_squared"], abs=0.0051)
    assert abs(expected["chi_squared"] - plain["chi_squared"]) > 1
    trend = page.locator("#rank-test p", has_text="Along the order of the groups")
    assert numbers(trend.inner_text())[0] == pytest.approx(expected["trend"]["z"], abs=0.0051)
    expect(page.locator("#rank-test")).to_contain_text("Compared within levels of “Sex”")


def test_a_missing_score_asks_nothing_and_equal_scores_are_refused(page: Page) -> None:
    page.locator("#compare-ordered").select_option("yes")
    for position in (0, 1, 2):
        page.locator(f"#compare-score-{position}").fill("4")
        page.locator(f"#compare-score-{position}").press("Tab")
    expect(page.locator("#rank-test .refusal")).to_contain_text(
        "All groups have the same score", timeout=ANSWER_MS
    )
    page.locator("#compare-score-1").fill("")
    page.locator("#compare-score-1").press("Tab")
    expect(page.locator("#compare-score-1-fault")).to_contain_text("A number is missing")
    expect(page.locator("#rank-test .refusal")).to_have_count(0)


def test_groups_found_in_different_ways_are_said_beside_every_comparison(page: Page) -> None:
    blocks = ("alike", "difference", "rank-test", "intervals", "cox", "subdistribution")
    page.locator("#compare-found").select_option("differently")
    for block in blocks:
        expect(page.locator(f"#{block} .cautions")).to_contain_text("lead time", timeout=ANSWER_MS)
    page.locator("#compare-found").select_option("alike")
    for block in blocks:
        expect(page.locator(f"#{block}")).not_to_contain_text("lead time", timeout=ANSWER_MS)
