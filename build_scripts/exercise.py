"""Every task of the desk carried out once; a refusal is a failure.

The build traces this inside Pyodide to learn which files the engine touches, and carries it out
again with nothing but the pack. It needs only the engine, numpy and the demo register.
"""

from __future__ import annotations

import csv
import io
import json
import zipfile
from typing import Any
from xml.sax.saxutils import escape

from demo_register import demo_register
from vitalroll.desk import Desk

CLOSING = "2025-06-30"
BY_HEADING = "Severity at entry"


def everything() -> None:
    """Carry out every task; raise RuntimeError at the first refusal or when one was left out."""
    desk = Desk()
    asked: set[str] = set()

    def ask(task: str, **request: Any) -> dict[str, Any]:
        asked.add(task)
        said = desk.answer(task, request)
        if "refusal" in said:
            raise RuntimeError(f"{task} was refused: {json.dumps(said['refusal'])}")
        return said["answer"]

    ask("about")
    text = demo_register()
    ask("register.open", name="demo.xlsx", content=small_workbook(text))
    ask("register.open", name="demo.ods", content=small_open_document(text))
    source = ask("register.open", name="demo-register.csv", content=text.encode())
    reading = proposed_reading(ask, source, CLOSING)
    cohort = ask("register.build", **reading)
    ask("register.silent_losses", **reading)
    ask("register.trace_list", **reading, columns=[source["columns"][0]["id"]])
    ask("register.profile", **reading)
    saved = ask("register.settings", **reading)["settings"]
    ask("register.apply_settings", text=json.dumps(saved))
    ask("register.spellings", columns=[column["id"] for column in source["columns"]])
    ask("register.findings", **reading, repairs={"unseen_for_long": [], "same_number": []})
    group = next(each["id"] for each in cohort["covariates"] if each["heading"] == BY_HEADING)
    _outcomes(ask, group)
    _comparisons(ask, group)
    _caseload(ask)
    _counts(ask)
    ask("register.forget")
    left_out = set(desk.tasks()) - asked
    if left_out:
        raise RuntimeError(f"not exercised, so not packed: {sorted(left_out)}")


def proposed_reading(ask: Any, source: dict[str, Any], closing_date: str) -> dict[str, Any]:
    """Return the request of register.build that accepts every proposal, as the page does."""
    reading: dict[str, Any] = {
        "roles": {column["id"]: column["role"] for column in source["columns"] if column["role"] != "none"},
        "meanings": {},
        "sexes": {},
        "closing_date": closing_date,
    }
    for column in source["columns"]:
        if column["role"] in ("outcome", "sex"):
            for value in ask("register.values", column=column["id"])["values"]:
                kind, field = ("meaning", "meanings") if column["role"] == "outcome" else ("sex", "sexes")
                if value[kind]:
                    reading[field][value["value"]] = value[kind]
    return reading


def _outcomes(ask: Any, group: str) -> None:
    ask("outcomes.survival", group=group)
    ask("outcomes.life_table", group=group)
    ask("outcomes.leaving", group=group)
    ask("outcomes.mean_time", group=group)
    ask("outcomes.tipping", group=group)
    for scale in ("year", "since_start", "age"):
        ask("outcomes.rates", group=group, by=scale)


def _comparisons(ask: Any, group: str) -> None:
    pair = {"group": group, "exposed": "Severe", "reference": "Mild"}
    ask("compare.alike", **pair, timing={"known": "later", "landmark_days": 180})
    ask("compare.difference", **pair)
    ask("compare.intervals", **pair)
    ask("compare.rank_test", group=group, stratify="sex", scores={"Mild": 1, "Moderate": 2, "Severe": 3})
    ask("compare.cox", covariates=[{"id": group, "reference": "Mild"}, {"id": "age", "per": 10}])
    ask("compare.subdistribution", covariates=[{"id": group}], interest=["died_of_disease"])


def _caseload(ask: Any) -> None:
    setting = {"years": 3, "draws": 100}
    items = [{"name": "Visits", "at_start": 2, "first_year": 1, "later": 0.5, "unit_cost": 8}]
    lines = [{"kind": "amount", "item": 0, "limit": 900}, {"kind": "beds", "item": 0, "limit": 90}]
    ask("caseload.history")
    ask("caseload.project", **setting)
    ask("caseload.project", **setting, newcomers={"basis": "trend"}, completeness=90, tail="halved")
    ask("caseload.resources", **setting, items=items, lines=lines)
    ask("caseload.back_test", back_years=2, draws=100)
    ask("caseload.parts", **setting)
    early = {"kind": "found_earlier", "percent": 20, "months_earlier": 6, "cost_per_year": 9000}
    scenarios = [{"name": "Both", "levers": [{"kind": "fewer_lost", "percent": 40}, early]}]
    ask("caseload.levers", **setting, items=items, scenarios=scenarios)
    ask("caseload.break_even", **setting, lever={"kind": "fewer_lost"}, goal="lost", target=80)


def _counts(ask: Any) -> None:
    rows = [{"width_years": 1, "lost": 4, "withdrawn": 10, "events": 7}]
    ask("counts.life_table", entering=100, rows=rows)
    stratum = {
        "label": "", "exposed_events": 5, "exposed_total": 50, "unexposed_events": 9, "unexposed_total": 60,
    }  # fmt: skip
    ask("counts.strata", strata=[stratum, stratum])
    ask("counts.balance", prevalent=100, new_per_year=20, leaving=[{"label": "", "per_year": 15}])
    ages = {
        "from_age": 0, "population": 900, "prevalence": 0.01, "incidence": 0.002,
        "mortality_well": 0.01, "mortality_ill": 0.03,
    }  # fmt: skip
    ask("counts.district", groups=[ages, ages | {"from_age": 40}])
    ask("counts.survival_size", hazard_ratio=2, survival=0.7, at_years=5, accrual_years=3, follow_up_years=2)
    ask("counts.proportions_size", exposed=0.1, reference=0.25, available=150)
    ask("counts.survey_size", proportion=0.5, margin=0.05, population=2000)
    ask("counts.accuracy_size", sensitivity=0.9, specificity=0.85, margin=0.05, prevalence=0.2)


def small_open_document(text: str) -> bytes:
    """Return CSV text as a small OpenDocument workbook."""
    spaces = " ".join(
        f'xmlns:{name}="urn:oasis:names:tc:opendocument:xmlns:{name}:1.0"'
        for name in ("office", "table", "text")
    )
    rows = "".join(
        "<table:table-row>"
        + "".join(
            f'<table:table-cell office:value-type="string"><text:p>{escape(cell)}</text:p></table:table-cell>'
            for cell in row
        )
        + "</table:table-row>"
        for row in csv.reader(io.StringIO(text))
    )
    content = (
        f'<?xml version="1.0" encoding="UTF-8"?><office:document-content {spaces}>'
        "<office:body><office:spreadsheet>"
        f'<table:table table:name="Register">{rows}</table:table>'
        "</office:spreadsheet></office:body></office:document-content>"
    )
    packed = io.BytesIO()
    with zipfile.ZipFile(packed, "w", zipfile.ZIP_DEFLATED) as archive:
        archive.writestr("mimetype", "application/vnd.oasis.opendocument.spreadsheet")
        archive.writestr("content.xml", content)
    return packed.getvalue()


def small_workbook(text: str) -> bytes:
    """Return CSV text as the smallest workbook there can be: one sheet of inline text."""
    rows = csv.reader(io.StringIO(text))
    lines = "".join(
        f'<row r="{number}">'
        + "".join(f'<c t="inlineStr"><is><t>{escape(cell)}</t></is></c>' for cell in row)
        + "</row>"
        for number, row in enumerate(rows, 1)
    )
    main = "http://schemas.openxmlformats.org/spreadsheetml/2006/main"
    package = "http://schemas.openxmlformats.org/package/2006"
    office = "http://schemas.openxmlformats.org/officeDocument/2006/relationships"
    kind = "application/vnd.openxmlformats-officedocument.spreadsheetml"
    parts = {
        "[Content_Types].xml": f'<Types xmlns="{package}/content-types">'
        '<Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>'
        f'<Override PartName="/xl/workbook.xml" ContentType="{kind}.sheet.main+xml"/>'
        f'<Override PartName="/xl/worksheets/sheet1.xml" ContentType="{kind}.worksheet+xml"/></Types>',
        "_rels/.rels": f'<Relationships xmlns="{package}/relationships">'
        f'<Relationship Id="r1" Type="{office}/officeDocument" Target="xl/workbook.xml"/></Relationships>',
        "xl/workbook.xml": f'<workbook xmlns="{main}" xmlns:r="{office}"><sheets>'
        '<sheet name="Register" sheetId="1" r:id="r1"/></sheets></workbook>',
        "xl/_rels/workbook.xml.rels": f'<Relationships xmlns="{package}/relationships">'
        f'<Relationship Id="r1" Type="{office}/worksheet" Target="worksheets/sheet1.xml"/></Relationships>',
        "xl/worksheets/sheet1.xml": f'<worksheet xmlns="{main}"><sheetData>{lines}</sheetData></worksheet>',
    }
    packed = io.BytesIO()
    with zipfile.ZipFile(packed, "w", zipfile.ZIP_DEFLATED) as archive:
        for name, content in parts.items():
            archive.writestr(name, '<?xml version="1.0" encoding="UTF-8"?>' + content)
    return packed.getvalue()
