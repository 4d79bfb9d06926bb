"""Every hard file, chosen in the built page: it says what the engine says, in words, and nothing breaks.

The expectations are those of ``tests/hard_cases/expected.json``, where each was checked by reading the file.
"""

from __future__ import annotations

import json
import re
from collections.abc import Callable
from pathlib import Path

import pytest
from hard_reading import CLOSING
from make import MADE
from playwright.sync_api import Page

from site_server import SiteServer

HARD = Path(__file__).parents[1] / "hard_cases"
EXPECTED = json.loads((HARD / "expected.json").read_text(encoding="utf-8"))
ENGLISH = (HARD.parents[1] / "web" / "words" / "en.ftl").read_text(encoding="utf-8")
ANSWER_MS = 60_000

ONE_OF = """() => {
  const place = document.getElementById('place-register');
  if (place.querySelector('#opening-progress')) return null;
  const refused = place.querySelector('.refusal');
  if (refused) return ['refused', refused.innerText];
  const understood = document.getElementById('understood-heading')?.parentElement;
  if (!understood) return null;
  if (understood.querySelector('.sentence')) return ['understood', understood.querySelector('.sentence').innerText];
  return understood.querySelector('ul') ? ['missing', understood.innerText] : null;
}"""
"""What the page has come to say of the file, or null while it is still reading."""

EVERY_ANSWER_SAYS_SOMETHING = """(id) => {
  const answers = [...document.querySelectorAll(`#${id} .answer`)];
  return answers.length > 0 && answers.every((each) => each.ariaBusy === 'false' && each.textContent.trim());
}"""


@pytest.fixture(scope="module")
def files(tmp_path_factory: pytest.TempPathFactory) -> dict[str, Path]:
    folder = tmp_path_factory.mktemp("made")
    found = {name: HARD / "files" / name for name in EXPECTED["files"]}
    for name, make in MADE.items():
        found[name] = folder / f"{name}.{'csv' if name == 'thirty megabytes' else 'xlsx'}"
        found[name].write_bytes(make())
    return found


@pytest.fixture
def page(site: SiteServer, opened: Callable) -> Page:
    return opened(site.address).page


def choose(page: Page, path: Path) -> tuple[str, str]:
    """Choose a file, accept every proposal, and return what the page says in the end."""
    if page.locator("#forget").count():
        page.locator("#forget").click()
        page.locator("#forget").wait_for(state="detached")
    # What is read afterwards must be of this file.
    page.evaluate("document.querySelector('#place-register .refusal')?.remove()")
    page.locator("#register-file").set_input_files(path)
    page.wait_for_function(
        "(before) => document.getElementById('closing-date') || document.querySelector('#place-register .refusal')"
        " && !document.getElementById('opening-progress')",
        timeout=ANSWER_MS,
    )
    if page.locator("#closing-date").count():
        unsettled = page.locator("select[id^='order-']:has(option[value='']:checked)")
        while unsettled.count():
            left = unsettled.count()
            unsettled.first.select_option(index=1)
            page.wait_for_function(
                "(left) => document.querySelectorAll("
                "\"select[id^='order-']:has(option[value='']:checked)\").length < left",
                arg=left,
            )
        page.locator("#closing-date").fill(CLOSING)
        page.locator("#closing-date").press("Tab")
    return settled(page)


def settled(page: Page) -> tuple[str, str]:
    """Return what the page says once it goes on saying it."""
    before = None
    while True:
        now = page.wait_for_function(ONE_OF, timeout=ANSWER_MS).json_value()
        if now == before:
            return tuple(now)
        before = now
        page.wait_for_timeout(250)


def first_words(code: str) -> str:
    """Return the English refusal up to its first number or name."""
    message = re.search(rf"^refusal-{code} = (.+)$", ENGLISH, re.MULTILINE)[1]
    return message.split("{")[0].strip()


def test_every_hard_file_is_read_or_refused_in_words(page: Page, files: dict[str, Path]) -> None:
    wrong = {}
    for name, path in files.items():
        expected = (EXPECTED["files"] | EXPECTED["made"])[name]
        kind, text = choose(page, path)
        if "refusal" in expected:
            right = kind == "refused" and first_words(expected["refusal"]) in text
        elif "build_refusal" in expected or expected["n"] == 0:
            right = kind in ("missing", "refused")
        else:
            right = (
                kind == "understood" and int(re.search(r"[\d,]+", text)[0].replace(",", "")) == expected["n"]
            )
        if not right:
            wrong[name] = (kind, text, expected)
    assert not wrong


def test_markup_in_a_heading_is_only_text(page: Page, files: dict[str, Path]) -> None:
    kind, _ = choose(page, files["markup_in_heading.csv"])
    assert kind == "understood"
    assert page.locator("#place-register img, #place-register script").count() == 0
    assert "<img src=x onerror=" in page.locator("#place-register").inner_text()
    page.get_by_role("navigation").get_by_role("link", name="Outcomes", exact=True).click()
    page.locator("#outcomes-group").select_option(index=1)
    page.locator("#survival .sentence, #survival .refusal, #survival .caution").first.wait_for(
        timeout=ANSWER_MS
    )
    assert page.locator("main img").count() == 0


def test_nobody_with_the_outcome_and_one_patient_are_answered(page: Page, files: dict[str, Path]) -> None:
    """A register in which all are under care, and one of a single patient: every place answers or says why not."""
    for name in ("all_under_care.csv", "one_patient.csv"):
        kind, _ = choose(page, files[name])
        assert kind == "understood"
        for place in ("Outcomes", "Compare", "Caseload"):
            page.get_by_role("navigation").get_by_role("link", name=place, exact=True).click()
            page.wait_for_function(
                EVERY_ANSWER_SAYS_SOMETHING, arg=f"place-{place.lower()}", timeout=ANSWER_MS
            )
        page.get_by_role("navigation").get_by_role("link", name="Register", exact=True).click()


def test_a_group_column_with_hundreds_of_values_asks_to_be_merged(page: Page, files: dict[str, Path]) -> None:
    choose(page, files["many_groups.csv"])
    page.get_by_role("combobox", name="Village").select_option("group")
    assert settled(page)[0] == "understood"
    page.get_by_role("navigation").get_by_role("link", name="Outcomes", exact=True).click()
    page.locator("#outcomes-group").select_option(label="Village")
    page.locator("#place-outcomes .refusal").first.wait_for(timeout=ANSWER_MS)
    assert "500 groups" in page.locator("#place-outcomes .refusal").first.inner_text()
