"""A worker that dies is said to have died, started again, and given its register and choices back."""

from __future__ import annotations

from collections.abc import Callable

from playwright.sync_api import Page

from site_server import SiteServer

ANSWER_MS = 90_000


def open_demo(page: Page) -> None:
    page.locator("#open-demo").click()
    page.locator("#place-register .next").wait_for(timeout=ANSWER_MS)


def kill_worker(page: Page) -> None:
    """Crash the worker's process of thought: its global scope throws from outside of any task."""
    worker = page.workers[-1]
    worker.evaluate("() => { setTimeout(() => { throw new Error('killed by the test') }) }")


def test_a_dead_worker_comes_back_with_its_register(site: SiteServer, opened: Callable) -> None:
    watched = opened(site.address)
    page = watched.page
    open_demo(page)
    page.evaluate("() => { location.hash = 'outcomes' }")
    page.locator("#survival .sentence").wait_for(timeout=ANSWER_MS)
    before = page.locator("#survival .sentence").inner_text()
    kill_worker(page)
    page.get_by_text("was started again").wait_for(timeout=ANSWER_MS)
    page.locator("#outcomes-interval").select_option("plain")
    page.locator("#outcomes-interval").select_option("log-log")
    page.wait_for_function(
        "(before) => document.querySelector('#survival .sentence')?.innerText === before", arg=before
    )
    page.locator("#outcomes-step").select_option("quarter")
    page.locator("#life-table caption").first.wait_for(timeout=ANSWER_MS)
    watched.complaints.clear()


def test_running_out_of_memory_is_said_and_survived(site: SiteServer, opened: Callable) -> None:
    """A file far beyond any memory is never copied: the page asks for a giant answer instead."""
    watched = opened(site.address)
    page = watched.page
    open_demo(page)
    worker = page.workers[-1]
    worker.evaluate(
        "() => { const grow = []; setTimeout(() => { for (;;) grow.push(new ArrayBuffer(2 ** 33)); }) }"
    )
    page.get_by_text("was started again").wait_for(timeout=ANSWER_MS)
    page.evaluate("() => { location.hash = 'outcomes' }")
    page.locator("#survival .sentence").wait_for(timeout=ANSWER_MS)
    watched.complaints.clear()


def test_stop_ends_reading_and_leaves_the_page_usable(site: SiteServer, opened: Callable) -> None:
    page = opened(site.address).page
    rows = "\n".join(f"{i},01/02/20{10 + i % 10},05/06/2021,Lost,{'x' * 60}" for i in range(200_000))
    content = ("Number,Diagnosed,Last contact,Status,Note\n" + rows).encode()
    page.locator("#register-file").set_input_files(
        {"name": "big.csv", "mimeType": "text/csv", "buffer": content}
    )
    page.locator("#opening-stop").click(timeout=ANSWER_MS)
    page.get_by_text("Stopped before it was finished").wait_for(timeout=ANSWER_MS)
    open_demo(page)
