"""The rule for silent losses and the merging of spellings on the page, against the engine outside it."""

from __future__ import annotations

import re
from collections.abc import Callable
from pathlib import Path
from typing import Any

from hard_reading import CLOSING, request_as_proposed
from playwright.sync_api import Page

from site_server import SiteServer
from vitalroll.desk import Desk

FILE = Path(__file__).parents[1] / "hard_cases" / "files" / "misspelt_values.csv"
ANSWER_MS = 30_000


def opened_page(site: SiteServer, opened: Callable) -> Page:
    page = opened(site.address).page
    page.locator("#register-file").first.set_input_files(FILE)
    page.locator("#closing-date").wait_for(timeout=ANSWER_MS)
    page.locator("#closing-date").fill(CLOSING)
    page.locator("#closing-date").blur()
    page.locator("#silent-losses .sentence").wait_for(timeout=ANSWER_MS)
    return page


def native(task: str, **more: Any) -> dict[str, Any]:
    desk = Desk()
    source = desk.answer("register.open", {"name": FILE.name, "content": FILE.read_bytes()})["answer"]
    return desk.answer(task, request_as_proposed(desk, source, CLOSING) | more)["answer"]


def cells(page: Page, block: str) -> list[list[str]]:
    rows = page.locator(f"#{block} tbody tr").all()
    return [[cell.inner_text() for cell in row.locator("th, td").all()] for row in rows]


def test_the_months_of_the_rule_and_what_it_changes(site: SiteServer, opened: Callable) -> None:
    page = opened_page(site, opened)
    page.locator("#unseen-months").fill("15")
    page.locator("#unseen-months").blur()
    page.locator("#silent-losses tr.chosen", has_text="15").wait_for(timeout=ANSWER_MS)
    expected = native("register.silent_losses", unseen_months=15)
    shown = [[float(cell.rstrip("%")) for cell in row] for row in cells(page, "silent-losses")]
    wanted = [
        [row["months"], row["changed"], row["lost"], round(100 * row["share"], 1)] for row in expected["rows"]
    ]
    assert shown == wanted
    page.locator("#silent-count").check()
    page.get_by_text("and count as lost:").wait_for(timeout=ANSWER_MS)
    counted = native("register.build", unseen_months=15, repairs={"unseen_for_long": []})
    table = page.locator("table", has=page.locator("caption", has_text="How follow-up ended")).first
    row = table.locator("tbody tr", has_text="lost to follow-up")
    assert int(row.locator("td").first.inner_text()) == counted["outcomes"]["lost"]
    assert page.locator("#repair-unseen_for_long").is_checked()


def test_spellings_are_made_one_only_when_asked(site: SiteServer, opened: Callable) -> None:
    page = opened_page(site, opened)
    proposed = {row[0]: row[2] for row in cells(page, "spellings")}
    assert proposed == {"Old Markt": "Old Market", "LAKE SIDE": "Lakeside", "Laekside": "Lakeside"}
    # Misspelt endings are proposed the meaning of what they look like; none of them is set aside.
    assert page.locator("#meanings-heading ~ .scroll select").evaluate_all(
        "selects => selects.every((select) => select.value !== '')"
    )
    for box in page.locator("#spellings input").all():
        box.focus()
        page.keyboard.press("Space")
        page.wait_for_timeout(500)
    assert page.locator("#spellings input:checked").count() == 3
    page.get_by_role("navigation").get_by_role("link", name="Outcomes", exact=True).click()
    page.locator("#outcomes-group").select_option(label="Village")
    page.locator("#survival").get_by_text("Old Market").first.wait_for(timeout=ANSWER_MS)
    spellings = {"c6": dict(proposed)}
    cohort = native("register.build", spellings=spellings)
    levels = next(each["levels"] for each in cohort["covariates"] if each["id"] == "c6")
    assert [(each["level"], each["n"]) for each in levels] == [("Lakeside", 6), ("Old Market", 4)]
    text = page.locator("#survival").inner_text()
    assert not re.search("Markt|LAKE|Laekside", text)
