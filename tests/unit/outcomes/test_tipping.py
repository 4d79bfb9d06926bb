"""Survival over how the lost may have fared: its ends, its middle, and a slow patient-by-patient version."""

from __future__ import annotations

import numpy as np
import pytest

from vitalroll.desk import Desk
from vitalroll.desk.loss_tasks import _tips_at
from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.losses import losses_by
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.risk_table import risk_table
from vitalroll.outcomes.tipping import survival_if_the_lost_fared
from vitalroll.register.cohort import Categorical, Cohort, meaning_code

DIED = ("died_of_disease",)


def cohort_of(seed: int, n: int, *, late: bool = False) -> Cohort:
    random = np.random.default_rng(seed)
    start = 730_000 + random.integers(0, 1500, n)
    closing = 732_000
    exit = np.minimum(random.exponential(900, n).astype(int) + 1, closing - start)
    outcome = random.choice(
        [meaning_code("died_of_disease"), meaning_code("lost"), meaning_code("moved_away")], n
    )
    outcome = np.where(exit == closing - start, meaning_code("under_care"), outcome)
    entry = np.where(random.random(n) < 0.3, exit // 3, 0) if late else np.zeros(n, dtype=int)
    return Cohort(entry=entry, exit=exit, outcome=outcome, start=start, line=np.arange(n), closing=closing)


@pytest.mark.parametrize("late", [False, True])
@pytest.mark.parametrize("seed", range(3))
def test_a_delta_of_one_is_the_product_limit_and_none_the_best_bound(seed: int, late: bool) -> None:
    subject = cohort_of(seed, 150, late=late)
    years = 2.0
    best, middle = survival_if_the_lost_fared(subject, DIED, years * DAYS_PER_YEAR, [0, 1])
    assert middle == pytest.approx(
        product_limit(risk_table(subject), DIED).at(years * DAYS_PER_YEAR).value, abs=1e-12
    )
    bound = losses_by(subject, DIED, None, [years])[None].bounds[0]
    assert best == pytest.approx(bound.none_died, abs=1e-12)


def test_survival_falls_with_delta_towards_the_worst_bound() -> None:
    subject = cohort_of(7, 200)
    found = survival_if_the_lost_fared(subject, DIED, 2 * DAYS_PER_YEAR, [0, 0.5, 1, 2, 5, 20, 1000])
    assert (np.diff(found) < 0).all()
    worst = losses_by(subject, DIED, None, [2.0])[None].bounds[0].all_died
    # With delta without end the lost go on the next day anybody does, not on the day they were last seen.
    assert found[-1] == pytest.approx(worst, abs=0.02)


def test_against_following_each_lost_patient_by_chance() -> None:
    """A slow simulation: each lost patient's own day is drawn from hazards delta times those of the curve."""
    subject = cohort_of(11, 120)
    delta, day = 3.0, int(2 * DAYS_PER_YEAR)
    table = risk_table(subject)
    events = table.events(DIED)
    random = np.random.default_rng(1)
    total = []
    lost = np.flatnonzero(subject.outcome == meaning_code("lost"))
    for _ in range(400):
        exit, outcome = subject.exit.copy(), subject.outcome.copy()
        for i in lost:
            until = max(subject.exit[i], subject.closing - subject.start[i])
            exit[i], outcome[i] = until, meaning_code("under_care")
            for time, d, n in zip(table.time, events, table.at_risk, strict=True):
                if subject.exit[i] < time <= until and d and random.random() < 1 - (1 - d / n) ** delta:
                    exit[i], outcome[i] = time, meaning_code("died_of_disease")
                    break
        drawn = Cohort(
            entry=subject.entry, exit=exit, outcome=outcome, start=subject.start, line=subject.line,
            closing=subject.closing,
        )  # fmt: skip
        total.append(product_limit(risk_table(drawn), DIED).at(day).value)
    found = survival_if_the_lost_fared(subject, DIED, day, [delta])[0]
    # Four standard errors of the mean of 400 runs, and what the curve of an average differs from an average of curves.
    assert found == pytest.approx(np.mean(total), abs=4 * np.std(total) / 20 + 0.003)


def test_beyond_follow_up_and_with_loss_as_the_outcome() -> None:
    subject = cohort_of(1, 30)
    assert np.isnan(survival_if_the_lost_fared(subject, DIED, 10_000, [1])).all()
    with pytest.raises(Refusal) as refused:
        survival_if_the_lost_fared(subject, ("lost",), 100, [1])
    assert refused.value.code == "lost_is_the_outcome"


def test_the_better_group_is_the_one_whose_lost_are_doubted() -> None:
    """The first group does better by far; its lost are a third, so doubting them narrows the difference."""
    random = np.random.default_rng(5)
    n = 400
    group = np.repeat([0, 1], n // 2)
    exit = np.minimum(random.exponential(np.where(group == 0, 2500, 900)).astype(int) + 1, 1500)
    died, lost = meaning_code("died_of_disease"), meaning_code("lost")
    outcome = np.where(exit == 1500, meaning_code("under_care"), np.where(random.random(n) < 0.5, died, lost))
    desk = Desk()
    desk._memory.built = Cohort(
        entry=np.zeros(n, dtype=int), exit=exit, outcome=outcome, start=np.full(n, 730_000), line=np.arange(n),
        closing=732_000, covariates={"g": Categorical("Group", ("good", "bad"), group)},
    )  # fmt: skip
    answer = desk.answer("outcomes.tipping", {"group": "g", "years": 2})["answer"]
    (pair,) = answer["against"]
    assert pair["better"] == "good"
    values = [abs(each["value"]) for each in pair["differences"]]
    assert values == sorted(values, reverse=True)
    limits = pair["differences"][answer["deltas"].index(1.0)]
    assert limits["upper"] < 0


def asked(outcomes: list[str], exits: list[int], years: float = 0.5, entry: list[int] | None = None) -> dict:
    n = len(exits)
    desk = Desk()
    desk._memory.built = Cohort(
        entry=np.array(entry or [0] * n), exit=np.array(exits), outcome=np.array([meaning_code(each) for each in outcomes]),
        start=np.full(n, 730_000), line=np.arange(n), closing=732_000,
    )  # fmt: skip
    return desk.answer("outcomes.tipping", {"years": years})


@pytest.mark.parametrize(
    ("outcomes", "exits", "entry"),
    [
        (["lost"] * 8, [400] * 8, None),
        (["under_care"] * 8, [400] * 8, None),
        (["died_of_disease"] * 4 + ["lost"] * 4, [50, 60, 70, 80, 400, 400, 400, 400], None),
        (["died_of_disease"] * 8, [120, 130, 140, 150, 160, 400, 410, 420], [100] * 8),
        (["died_of_disease"] * 5 + ["lost"] * 3, [10] * 8, None),
    ],
    ids=["all lost", "no outcomes", "few outcomes", "begins late", "not followed so far"],
)
def test_where_nothing_can_be_said_no_number_is_given(outcomes, exits, entry) -> None:
    assert asked(outcomes, exits, entry=entry)["refusal"]["code"] == "too_few_to_tip"


def test_the_multiple_at_which_it_tips_lies_between_the_deltas_around_it() -> None:
    lower = np.array([0.3, 0.25, 0.2, 0.15, 0.1, 0.05, -0.05, -0.1, -0.2, -0.3])
    assert _tips_at(lower, lower + 1) == pytest.approx(np.sqrt(3.0 * 4.0))
    assert _tips_at(np.full(10, 0.1), np.full(10, 0.2)) is None
