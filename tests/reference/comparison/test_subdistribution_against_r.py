"""Fine & Gray's model against two R packages, on data that scikit-survival ships.

R 4.2.2, cmprsk 2.2-11, survival 3.5-3 (Debian 12). Times are whole days, round(365.25 * ftime); of the outcomes 1 is
of interest and 2 and 3 rule it out.
"""

from __future__ import annotations

import numpy as np
import pytest
from sksurv.datasets import load_cgvhd

from vitalroll.comparison.design import Choice
from vitalroll.comparison.subdistribution import SubdistributionFit, fine_gray
from vitalroll.register.cohort import Cohort, Numeric, meaning_code

MEANING = ["under_care", "died_of_disease", "died_of_other_cause", "recovered"]


def fitted(entry: np.ndarray) -> SubdistributionFit:
    x, y = load_cgvhd()
    exit = np.rint(365.25 * y["ftime"]).astype(np.int64)
    keep = entry < exit
    covariates = {
        "tx": (x["tx"] == "PB").to_numpy(float), "extent": (x["extent"] == "E").to_numpy(float), "age": x["age"].to_numpy(),
    }  # fmt: skip
    cohort = Cohort(
        entry=entry[keep], exit=exit[keep],
        outcome=np.array([meaning_code(MEANING[status]) for status in y["status"][keep]]),
        start=np.full(keep.sum(), 730_000), line=np.arange(keep.sum()), closing=760_000,
        covariates={name: Numeric(None, values[keep]) for name, values in covariates.items()},
    )  # fmt: skip
    return fine_gray(
        cohort,
        ["died_of_disease"],
        ["died_of_other_cause", "recovered"],
        [Choice(name) for name in covariates],
    )


def test_coefficients_errors_and_likelihood() -> None:
    """crr(t, status, cbind(tx, extent, age), failcode=1, cencode=0).

    That program stops its climb early: its coefficients are good to 1e-7 of a standard error or so. The last
    digits of the coefficients are those of coxph(..., weights=fgwt, ties="breslow") on finegray(...).
    """
    fit = fitted(np.zeros(100, dtype=np.int64))
    coefficients = [term.coefficient for term in fit.terms]
    assert coefficients == pytest.approx(
        [0.1899536590591078, -1.8933828634604821, -0.0136766011437287], abs=1e-10
    )
    errors = [term.standard_error for term in fit.terms]
    assert errors == pytest.approx([0.21285240280923878, 0.73236490324098991, 0.00937840808584908], rel=1e-6)
    assert fit.log_likelihood[1] == pytest.approx(-328.205510056745, abs=1e-9)
    assert fit.events == 86
    assert fit.competing == 10


def test_delayed_entry() -> None:
    """finegray(Surv(e, t, factor(status)) ~ ., etype="1", id=id), then coxph(..., weights=fgwt, ties="breslow")."""
    random = np.random.default_rng(3)
    entry = np.where(random.random(100) < 0.4, random.integers(1, 120, 100), 0)
    coefficients = [term.coefficient for term in fitted(entry).terms]
    assert coefficients == pytest.approx(
        [0.1590695015871961, -2.0522240427267837, -0.0101126448886395], abs=1e-10
    )
