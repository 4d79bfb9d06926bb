"""How the tests read the page, as a person would: places by their links, tables by their captions."""

from __future__ import annotations

import re

from playwright.sync_api import Page

from exercise import BY_HEADING as GROUP

__all__ = ["ANSWER_MS", "DEATHS", "GROUP", "go", "numbers", "table_rows"]

ANSWER_MS = 30_000
DEATHS = ["died_of_disease", "died_of_other_cause", "died_cause_unknown"]


def go(page: Page, place: str) -> None:
    page.get_by_role("navigation").get_by_role("link", name=place, exact=True).click()


def numbers(text: str) -> list[float]:
    """Numbers as they are written on the English page."""
    plain = text.replace("\u2212", "-").replace(",", "")
    return [float(number) for number in re.findall(r"-?\d+(?:\.\d+)?", plain)]


def table_rows(page: Page, caption: str) -> list[list[str]]:
    table = page.locator("table:visible", has=page.locator("caption", has_text=caption)).first
    table.wait_for(timeout=ANSWER_MS)
    return [
        [cell.inner_text() for cell in row.locator("th, td").all()] for row in table.locator("tbody tr").all()
    ]
