"""Reads a register the way the page does when a person accepts every proposal."""

from __future__ import annotations

from typing import Any

from vitalroll.desk import Desk

CLOSING = "2025-06-30"


def read_as_proposed(name: str, content: bytes, closing: str = CLOSING) -> dict[str, Any]:
    """Open, accept what is proposed, build; return what matters of the answers or the refusal.

    Of dates whose order is not settled, the first choice is taken.
    """
    desk = Desk()
    opened = desk.answer("register.open", {"name": name, "content": content})
    if "refusal" in opened:
        return {"refusal": opened["refusal"]["code"]}
    source = opened["answer"]
    asked = request_as_proposed(desk, source, closing)
    built = desk.answer("register.build", asked)
    found: dict[str, Any] = {
        "rows": source["rows"],
        "roles": [column["role"] for column in source["columns"]],
        "open_cautions": [caution["code"] for caution in source["cautions"]],
    }
    if "refusal" in built:
        return found | {"build_refusal": built["refusal"]["code"]}
    cohort = built["answer"]
    return found | {
        "n": cohort["n"],
        "outcomes": {meaning: n for meaning, n in cohort["outcomes"].items() if n},
        "set_aside": cohort["set_aside_counts"],
        "changed": cohort["changed_counts"],
        "cautions": [caution["code"] for caution in cohort["cautions"]],
    }


def request_as_proposed(desk: Desk, source: dict[str, Any], closing: str = CLOSING) -> dict[str, Any]:
    """Return the request of register.build that accepts every proposal."""
    asked: dict[str, Any] = {
        "roles": {column["id"]: column["role"] for column in source["columns"]},
        "meanings": {},
        "sexes": {},
        "date_orders": {},
        "closing_date": closing,
    }
    for column in source["columns"]:
        if column["dates"] and not column["dates"]["settled"]:
            asked["date_orders"][column["id"]] = column["dates"]["choices"][0]
        for value in desk.answer("register.values", {"column": column["id"]})["answer"]["values"]:
            if column["role"] == "outcome" and value["meaning"]:
                asked["meanings"][value["value"]] = value["meaning"]
            if column["role"] == "sex" and value["sex"]:
                asked["sexes"][value["value"]] = value["sex"]
    return asked
