"""What the built page costs on large registers: ``.venv/bin/python tests/bench/in_the_browser.py`` after a build.

Prints; asserts nothing about time. Chromium, a fresh one for each line, on this machine:

- a register of 50,000 rows x 12 and one of 200,000 x 30, from the drop to the survival curve, as a ratio to pandas
  reading the same file natively;
- Cox of 100,000 x 10, from ticking the tenth covariate to the table on the page, as a ratio to the same question asked
  of the native desk.

Memory is the largest resident set of the renderer process, as Linux keeps it.
"""

from __future__ import annotations

import sys
import tempfile
import time
from pathlib import Path

HOUSE = Path(__file__).parents[2]
sys.path[:0] = [str(HOUSE / "core"), str(HOUSE / "build_scripts"), str(Path(__file__).parent)]

import numpy as np
import pandas as pd
from playwright.sync_api import Page
from start import LIMIT_MS, fresh_browser, peak_memory

from make_dist import DIST
from site_server import SiteServer
from vitalroll.desk import Desk

CLOSING = "2025-06-30"
DEATHS = ["died_of_disease", "died_of_other_cause", "died_cause_unknown"]

TO_THE_CURVE = """([closing]) => new Promise((drawn, failed) => {
  const begun = performance.now();
  let read = 0;
  const look = () => {
    const refused = document.querySelector('#place-register .refusal');
    if (refused) return failed(new Error(refused.textContent));
    const date = document.getElementById('closing-date');
    if (date && !date.value) {
      read = performance.now() - begun;
      date.value = closing;
      date.dispatchEvent(new Event('change', { bubbles: true }));
    }
    if (document.querySelector('#understood-heading ~ .sentence') && location.hash !== '#outcomes') location.hash = 'outcomes';
    if (document.querySelector('#survival svg')) drawn([read, performance.now() - begun]);
    else setTimeout(look, 20);
  };
  look();
})"""


def register(rows: int, columns: int) -> str:
    """Return a register of invented patients with so many rows and columns, as delimited text."""
    random = np.random.default_rng(7)
    start = np.datetime64("2012-01-01") + random.integers(0, 4400, rows)
    stay = random.exponential(2500, rows).astype(int) + 1
    closing = np.datetime64(CLOSING)
    end = np.minimum(start + stay, closing)
    ended = np.where(
        end < closing, random.choice(["Died - disease", "Lost", "Transferred out"], rows), "Under care"
    )
    frame = pd.DataFrame({
        "Reg no": np.arange(rows) + 1, "Sex": random.choice(["F", "M"], rows), "Age": random.integers(5, 70, rows),
        "Diagnosed": pd.Series(start).dt.strftime("%d/%m/%Y"), "Last contact": pd.Series(end).dt.strftime("%d/%m/%Y"),
        "Status": ended, "Severity": random.choice(["Mild", "Moderate", "Severe"], rows),
    })  # fmt: skip
    for i in range(columns - frame.shape[1]):
        frame[f"Measure {i + 1}"] = random.normal(50, 10, rows).round(1)
    return frame.to_csv(index=False)


def ready(page: Page, address: str) -> None:
    """Open the page and wait for its engine."""
    page.set_default_timeout(LIMIT_MS)
    page.goto(address)
    page.locator("#engine-progress").wait_for(state="detached")


def from_drop_to_curve(address: str, folder: Path, rows: int, columns: int) -> None:
    """Print how long a large register takes, beside pandas reading the same file."""
    path = folder / "register.csv"
    path.write_text(register(rows, columns), encoding="utf-8")
    begun = time.perf_counter()
    pd.read_csv(path)
    natively = time.perf_counter() - begun
    with fresh_browser() as browser:
        page = browser.new_page()
        ready(page, address)
        before = peak_memory(browser)
        page.locator("#register-file").set_input_files(path)
        opened, drawn = (ms / 1000 for ms in page.evaluate(TO_THE_CURVE, [CLOSING]))
        peak = peak_memory(browser)
    print(
        f"{rows:,} x {columns}, {path.stat().st_size / 1e6:.0f} MB: understood after {opened:.1f} s, curve after {drawn:.1f} s, "
        f"{drawn / natively:.0f} times pandas reading it natively ({natively:.2f} s); "
        f"peak memory {peak / 1e6:.0f} MB, {peak / before:.1f} of the started page's {before / 1e6:.0f} MB"
    )


def cox_in_the_page(address: str, folder: Path) -> None:
    """Print Cox in the page beside the native desk."""
    text = register(100_000, 17)
    path = folder / "cox.csv"
    path.write_text(text, encoding="utf-8")
    desk = Desk()
    source = desk.answer("register.open", {"name": "cox.csv", "content": text.encode()})["answer"]
    measures = [column["id"] for column in source["columns"] if column["heading"].startswith("Measure")]
    roles = {column["id"]: column["role"] for column in source["columns"] if column["role"] != "none"}
    roles |= dict.fromkeys(measures, "group")
    meanings = {
        "Died - disease": "died_of_disease",
        "Lost": "lost",
        "Transferred out": "moved_away",
        "Under care": "under_care",
    }
    built = desk.answer("register.build", {"roles": roles, "meanings": meanings, "sexes": {"F": "female", "M": "male"},
                                           "date_orders": {}, "closing_date": CLOSING})  # fmt: skip
    assert "answer" in built, built
    covariates = [{"id": each, "per": 10} for each in measures]
    times = []
    for _ in range(3):
        begun = time.perf_counter()
        said = desk.answer("compare.cox", {"interest": DEATHS, "covariates": covariates})
        times.append(time.perf_counter() - begun)
        assert "answer" in said, said
    natively = min(times)
    with fresh_browser() as browser:
        page = browser.new_page()
        ready(page, address)
        page.locator("#register-file").set_input_files(path)
        page.locator("#closing-date").wait_for()
        for measure in measures:
            page.locator(f"#role-{measure}").select_option("group")
        page.evaluate(TO_THE_CURVE, [CLOSING])
        page.evaluate("location.hash = 'compare'")
        page.locator("#cox-covariates-0").wait_for()
        for i in range(9):
            page.get_by_label(f"Measure {i + 1}", exact=True).check()
        page.wait_for_function("() => document.querySelectorAll('#cox table tbody tr').length >= 9")
        page.wait_for_timeout(3000)
        page.evaluate("""() => {
          window.begun = 0;
          document.addEventListener('change', () => { window.begun ||= performance.now(); }, true);
          new MutationObserver(() => {
            if (window.begun && !window.took && /Measure 10\\b/.test(document.querySelector('#cox table')?.textContent ?? ''))
              window.took = performance.now() - window.begun;
          }).observe(document.body, { subtree: true, childList: true });
        }""")
        page.get_by_label("Measure 10", exact=True).check()
        took = page.wait_for_function("() => window.took").json_value() / 1000
    print(
        f"Cox, 100,000 x 10, in the page {took:.2f} s, {took / natively:.1f} of native ({natively:.2f} s); limit 6"
    )


def main() -> None:
    """Print every line."""
    server = SiteServer(DIST / "site").start()
    with tempfile.TemporaryDirectory() as name:
        cox_in_the_page(server.address, Path(name))
        from_drop_to_curve(server.address, Path(name), 50_000, 12)
        from_drop_to_curve(server.address, Path(name), 200_000, 30)
    server.shutdown()


if __name__ == "__main__":
    main()
