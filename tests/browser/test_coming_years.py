"""The coming years on the built page, beside the engine outside the browser."""

from __future__ import annotations

import re
from collections.abc import Callable

import pytest
from playwright.sync_api import Page

from demo_register import demo_register
from exercise import CLOSING, proposed_reading
from site_server import SiteServer
from vitalroll.desk import Desk

ANSWER_MS = 30_000
VISITS = {"name": "Visits", "unit": "visits", "at_start": 1, "first_year": 1, "later": 0.33, "unit_cost": 8}


@pytest.fixture(scope="module")
def native() -> Callable[[str, dict], dict]:
    """The engine outside the browser, with the demo register read as the page proposes to read it."""
    desk = Desk()

    def ask(task: str, request: dict) -> dict:
        said = desk.answer(task, request)
        assert "answer" in said, said
        return said["answer"]

    source = ask("register.open", {"name": "demo-register.csv", "content": demo_register().encode()})
    ask("register.build", proposed_reading(lambda task, **request: ask(task, request), source, CLOSING))
    return ask


def numbers(text: str) -> list[float]:
    """Numbers as they are written on the English page."""
    plain = text.replace("\u2212", "-").replace(",", "")
    return [float(number) for number in re.findall(r"-?\d+(?:\.\d+)?", plain)]


def table_rows(page: Page, caption: str) -> list[list[str]]:
    table = page.locator("table:visible", has=page.locator("caption", has_text=caption)).first
    table.wait_for(timeout=ANSWER_MS)
    return [row.locator("th, td").all_inner_texts() for row in table.locator("tbody tr").all()]


@pytest.fixture
def page(site: SiteServer, opened: Callable) -> Page:
    page = opened(site.address).page
    page.locator("#open-demo").click()
    page.get_by_text("person-years.").first.wait_for(timeout=ANSWER_MS)
    page.get_by_role("navigation").get_by_role("link", name="Caseload", exact=True).click()
    return page


def put(page: Page, field: str, value: object) -> None:
    page.locator(field).fill(str(value))
    page.locator(field).press("Tab")


def test_the_month_in_which_slots_run_out_and_what_it_costs(page: Page, native: Callable) -> None:
    for name, value in VISITS.items():
        put(page, f"#items-0-{name}", value)
    page.locator("#lines-0-what").select_option("amount:0")
    put(page, "#lines-0-name", "Clinic slots")
    put(page, "#lines-0-limit", 320)
    lines = [{"kind": "amount", "name": "Clinic slots", "limit": 320, "item": 0}]
    told = native("caseload.resources", {"items": [VISITS], "lines": lines})
    page.locator("#resources .sentence", has_text="Clinic slots").wait_for(timeout=ANSWER_MS)
    rows = table_rows(page, "Visits (visits) in each year")
    for row, band in zip(rows, told["items"][0]["amount"], strict=True):
        assert numbers(row[1]) == [round(band["value"])]
        # The redrawn bands come from the same seed in both places.
        assert numbers(row[3]) == [round(limit) for limit in band["p95"]]
    [line] = told["lines"]
    [shown] = table_rows(page, "When there is no longer enough")
    assert numbers(shown[4])[0] == line["unlikely_month"]["month"]
    # Written without decimals.
    assert numbers(shown[6]) == pytest.approx([100 * line["passed_by"][-1]], abs=0.51)
    total = table_rows(page, "Cost of the whole time, discounted")[0]
    assert numbers(total[1]) == [round(told["totals"][0]["cost"]["value"])]


def test_what_is_typed_wrong_stays_and_is_said_beside_it(page: Page) -> None:
    put(page, "#caseload-years", 45)
    page.locator("#caseload-years-fault").wait_for()
    assert page.locator("#caseload-years").input_value() == "45"
    put(page, "#caseload-years", 5)
    page.locator("#caseload-years-fault").wait_for(state="detached")
    put(page, "#items-0-later", -2)
    assert "0" in page.locator("#items-0-later-fault").inner_text()
    assert page.locator("#items-0-later").input_value() == "-2"
