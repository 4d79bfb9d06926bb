"""The traps of a comparison on the page: groups known too late, groups unlike, others coming first; and plans."""

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
    page.locator("#compare-exposed").select_option(label="Severe")
    page.locator("#compare-reference").select_option(label="Mild")
    page.locator("#alike .sentence").wait_for(timeout=ANSWER_MS)
    return page


def test_groups_known_later_are_not_compared_without_a_landmark(page: Page, native: Callable) -> None:
    expect(page.locator("#difference .cautions")).to_contain_text(
        "It was not said when the groups became known"
    )
    page.locator("#compare-known").select_option("later")
    for block in ("alike", "difference", "rank-test", "intervals", "cox", "subdistribution"):
        expect(page.locator(f"#{block} .refusal")).to_contain_text(
            "cannot be compared from the start", timeout=ANSWER_MS
        )
    page.locator("#compare-landmark").fill("6")
    page.locator("#compare-landmark").press("Tab")
    expect(page.locator("#difference .cautions")).to_contain_text("Counted from 183 days", timeout=ANSWER_MS)
    expected = native("compare.difference", {
        "interest": DEATHS, "group": native.group, "exposed": "Severe", "reference": "Mild",
        "timing": {"known": "later", "landmark_days": 183},
    })  # fmt: skip
    page.locator("#difference .sentence").wait_for(timeout=ANSWER_MS)
    row = next(row for row in reversed(expected["rows"]) if not row["beyond_follow_up"])
    assert abs(100 * row["difference"]["value"]) == pytest.approx(
        abs(
            numbers(table_rows(page, "Free of the outcome at chosen times")[expected["rows"].index(row)][3])[
                0
            ]
        ),
        abs=0.051,
    )
    page.locator("#undo").click()
    expect(page.locator("#difference .refusal")).to_contain_text(
        "cannot be compared from the start", timeout=ANSWER_MS
    )


def test_whether_groups_are_alike_stands_first(page: Page, native: Callable) -> None:
    page.locator("#compare-known").select_option("start")
    expected = native("compare.alike", {
        "interest": DEATHS, "group": native.group, "exposed": "Severe", "reference": "Mild", "timing": {"known": "start"},
    })  # fmt: skip
    page.get_by_text(f"Severe ({expected['exposed']['n']} patients)").wait_for(timeout=ANSWER_MS)
    rows = table_rows(page, "Characteristics of the groups")
    shown = [numbers(row[3])[0] for row in rows]
    assert shown == pytest.approx([line["standardised"] for line in expected["characteristics"]], abs=0.0051)
    expect(page.locator("#difference")).not_to_contain_text("It was not said")


def test_plans_answer_as_the_native_engine(page: Page, native: Callable) -> None:
    go(page, "From counts")
    for name, typed in {
        "hazard_ratio": "2",
        "survival": "70",
        "at_years": "5",
        "accrual_years": "3",
        "follow_up_years": "2",
    }.items():
        page.locator(f"#planning-{name}").fill(typed)
        page.locator(f"#planning-{name}").press("Tab")
    expected = native("counts.survival_size", {
        "hazard_ratio": 2, "survival": 0.7, "at_years": 5, "accrual_years": 3, "follow_up_years": 2, "lost": 0.1,
    })  # fmt: skip
    page.locator("#counts-planning .sentence").wait_for(timeout=ANSWER_MS)
    found = numbers(page.locator("#counts-planning .sentence").inner_text())
    assert expected["events"] == found[0] == 66
    assert expected["patients"] in found
    page.locator("#planning-survival").fill("100")
    page.locator("#planning-survival").press("Tab")
    expect(page.locator("#planning-survival-fault")).to_contain_text("Between 0 and 100")
    page.locator("#planning-question").select_option("survey_size")
    for name, typed in {"proportion": "50", "margin": "5", "response": "100", "population": "2000"}.items():
        page.locator(f"#planning-{name}").fill(typed)
        page.locator(f"#planning-{name}").press("Tab")
    expect(page.locator("#counts-planning .sentence")).to_contain_text("Ask 323 people", timeout=ANSWER_MS)
