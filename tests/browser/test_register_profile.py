"""Profile and trace list on the page, against the engine outside it; the trace list stays out of the report."""

from __future__ import annotations

import csv
import io
import re
from collections.abc import Callable

import pytest
from playwright.sync_api import Page, expect

from demo_register import demo_register
from exercise import CLOSING, proposed_reading
from site_server import SiteServer
from vitalroll.desk import Desk

ANSWER_MS = 30_000


@pytest.fixture
def demo(site: SiteServer, opened: Callable) -> Page:
    page = opened(site.address).page
    page.locator("#open-demo").click()
    page.locator("#profile figure").first.wait_for(timeout=ANSWER_MS)
    return page


@pytest.fixture(scope="module")
def native() -> Callable[..., dict]:
    desk = Desk()

    def ask(task: str, **request: object) -> dict:
        return desk.answer(task, request)["answer"]

    source = ask("register.open", name="demo-register.csv", content=demo_register().encode())
    reading = proposed_reading(ask, source, CLOSING)
    return lambda task, **more: ask(task, **(reading | more))


def cells(page: Page, block: str, caption: str) -> list[list[str]]:
    table = page.locator(f"#{block} table", has=page.locator("caption", has_text=caption)).first
    table.wait_for(state="attached", timeout=ANSWER_MS)
    return table.locator("tbody tr").evaluate_all(
        "rows => rows.map((row) => [...row.cells].map((cell) => cell.textContent))"
    )


def number(text: str) -> float:
    return float(re.sub(r"[,%]", "", text))


def test_the_profile_shows_the_numbers_of_the_engine(demo: Page, native: Callable) -> None:
    page = demo
    page.locator("#profile-site").select_option(label="Zone")
    by_site = cells(page, "profile", "Completeness of follow-up, by group")
    wanted = native("register.profile", site="c7")
    assert len(by_site) == len(wanted["completeness"]["by_site"]) == 4
    for row, each in zip(by_site, wanted["completeness"]["by_site"], strict=True):
        assert row[0] == each["group"]
        assert [number(cell) for cell in row[1:]] == pytest.approx(
            [
                each["n"],
                each["observed_days"] / 365.25,
                each["possible_days"] / 365.25,
                100 * each["index"],
                100 * each["with_known"],
            ],
            abs=0.051,
        )
    shown = page.locator("#profile .sentence").first.inner_text()
    assert f"{100 * wanted['completeness']['everyone']['index']:.1f}%" in shown
    missing = cells(page, "profile", "What is missing")
    assert [number(row[1]) for row in missing] == [each["missing"] for each in wanted["missing"]]
    months = cells(page, "profile", "Newcomers by month")
    assert [number(row[1]) for row in months] == [each["count"] for each in wanted["months"]]
    digits = cells(page, "profile", "Ages from 23 to 62")
    assert [number(row[1]) for row in digits] == wanted["ages"]["digits"]
    index = page.locator("#profile .sentence", has_text="Whipple").inner_text()
    assert f"is {wanted['ages']['whipple']:.0f} (" in index


def test_the_trace_list_is_saved_with_picked_columns_and_never_reported(demo: Page, native: Callable) -> None:
    page = demo
    page.locator("#trace-months").fill("12")
    page.locator("#trace-months").blur()
    page.locator("#trace summary").click()
    page.locator("#trace-column-0").check()
    wanted = native("register.trace_list", overdue_months=12, columns=["c0"])
    save = page.locator("#trace-save", has_text=f"{wanted['n']}")
    save.wait_for(timeout=ANSWER_MS)
    first = wanted["rows"][0]["cells"][0]
    expect(page.locator("#trace table")).to_contain_text(first, timeout=ANSWER_MS)
    expect(page.locator("#trace .cautions")).to_contain_text("identifies people")
    with page.expect_download() as waiting:
        save.click()
    lines = list(csv.reader(io.StringIO(waiting.value.path().read_text(encoding="utf-8-sig"))))
    assert lines[0] == ["Line", "Days unseen", "Last contact", "How it ended", "Reg no"]
    assert [[int(line[0]), int(line[1]), line[2], line[4]] for line in lines[1:]] == [
        [row["line"], row["days"], row["last_contact"], row["cells"][0]] for row in wanted["rows"]
    ]
    days = [int(line[1]) for line in lines[1:]]
    assert days == sorted(days, reverse=True)
    page.get_by_role("navigation").get_by_role("link", name="Report", exact=True).click()
    piece = page.locator("#report-document [data-piece=trace]")
    piece.wait_for(timeout=ANSWER_MS)
    assert first not in page.locator("#report-document").inner_text()
    assert piece.locator("table").count() == 0
