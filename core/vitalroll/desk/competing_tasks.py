"""Comparing groups on one outcome when others can come first: the tasks behind that part of Compare."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any

from vitalroll.comparison.cox import Term, cox
from vitalroll.comparison.design import Choice
from vitalroll.comparison.subdistribution import fine_gray
from vitalroll.desk.comparison_tasks import (
    NOT_SAID,
    Confidence,
    CovariateChoice,
    GroupTiming,
    compared,
    timing_cautions,
)
from vitalroll.desk.memory import Memory
from vitalroll.errors import Refusal
from vitalroll.register.cohort import DEATHS, Cohort

RULED_OUT_BY = (*DEATHS, "recovered")
"""After these an outcome cannot come any more; after the other ways of leaving it can, unseen."""


@dataclass(frozen=True)
class SubdistributionRequest:
    """Fields of ``compare.subdistribution``; ``competing`` None: deaths and recovery not of interest."""

    covariates: tuple[CovariateChoice, ...]
    interest: tuple[str, ...] = DEATHS
    competing: tuple[str, ...] | None = None
    confidence: Confidence = 0.95
    timing: GroupTiming = NOT_SAID


def subdistribution(memory: Memory, request: SubdistributionRequest, report: Any) -> dict[str, Any]:
    """Answer ``compare.subdistribution``: Fine & Gray's model beside Cox's for each kind of outcome.

    Returns
    -------
    dict
        ``fit``, a ``SubdistributionFit``; ``competing``, the meanings that rule the outcome out;
        ``of_interest`` and ``of_competing``, the terms of the cause-specific models, empty where such a
        model was refused; ``cautions``.
    """
    cohort = compared(memory, request.timing)
    choices = [Choice(choice.id, choice.reference, choice.per) for choice in request.covariates]
    competing = request.competing
    if competing is None:
        competing = tuple(meaning for meaning in RULED_OUT_BY if meaning not in request.interest)
    fit = fine_gray(cohort, request.interest, competing, choices, confidence=request.confidence)
    return {
        "fit": fit,
        "competing": competing,
        "of_interest": _cause_specific(cohort, request.interest, choices, request.confidence),
        "of_competing": _cause_specific(cohort, competing, choices, request.confidence),
        "cautions": [*timing_cautions(request.timing), *fit.cautions],
    }


def _cause_specific(
    cohort: Cohort, interest: tuple[str, ...], choices: list[Choice], confidence: float
) -> tuple[Term, ...]:
    """Return the terms of Cox's model; none where it has too little to go on, which stops nothing here."""
    try:
        return cox(cohort, interest, choices, confidence=confidence).terms
    except Refusal:
        return ()


TASKS = {"compare.subdistribution": (SubdistributionRequest, subdistribution)}
