"""Person-time cut along calendar, age and duration; rates, their ratio and standardised rates."""

from __future__ import annotations

import datetime

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from scipy.special import bdtr, bdtrc

from vitalroll.errors import Refusal
from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.lexis import ages, calendar_years, split, years_since_start
from vitalroll.outcomes.rates import (
    STANDARD_AGES,
    STANDARDS,
    BandRate,
    rate_ratio,
    rates_by_band,
    standardise,
)
from vitalroll.register.cohort import Cohort, Numeric, meaning_code

DIED = ("died_of_disease",)


def cohort_of(start, entry, exit, died, age) -> Cohort:
    n = len(exit)
    return Cohort(
        entry=np.asarray(entry), exit=np.asarray(exit),
        outcome=np.where(died, meaning_code("died_of_disease"), meaning_code("under_care")),
        start=np.asarray(start), line=np.arange(n), closing=10**6, covariates={"age": Numeric(None, np.asarray(age, dtype=float))},
    )  # fmt: skip


def test_one_patient_by_hand() -> None:
    """From 1 July 2020, aged 19.75, for 730 days, dying on the last."""
    start = datetime.date(2020, 7, 1).toordinal()
    subject = cohort_of([start], [0], [730], [True], [19.75])
    scale, years = calendar_years(subject)
    pieces = split(subject, [scale])
    assert years == (2020, 2021, 2022)
    assert list(pieces.days) == [184, 365, 181]
    assert list(pieces.last) == [False, False, True]
    both = split(subject, [scale, ages(subject, [0, 20]), years_since_start(subject, [0, 1])])
    # Cut at the 20th birthday (day 91.3), 1 January 2021, one year after the start (365.25), 1 January 2022.
    assert np.cumsum(both.days) == pytest.approx([91.3125, 184, 365.25, 549, 730])
    assert both.band.tolist() == [[0, 0, 1, 1, 2], [0, 1, 1, 1, 1], [0, 0, 0, 1, 1]]


def test_an_outcome_on_the_day_of_a_cut_belongs_to_what_ends_there() -> None:
    start = datetime.date(2020, 1, 1).toordinal()
    subject = cohort_of([start], [0], [366], [True], [30])
    scale, _ = calendar_years(subject)
    rates = rates_by_band(subject, split(subject, [scale]), 0, scale.bands, DIED)
    assert [band.events for band in rates] == [1, 0]


@given(st.integers(0, 2**32 - 1))
@settings(max_examples=40, deadline=None)
def test_splitting_changes_no_total_and_agrees_with_counting_days(seed: int) -> None:
    """Against a slow second version that looks at every day of every patient."""
    random = np.random.default_rng(seed)
    n = 6
    exit = random.integers(1, 1200, n)
    entry = np.where(random.random(n) < 0.4, random.integers(0, exit), 0)
    start = 735_000 + random.integers(0, 700, n)
    # Whole days of age, so that birthdays of the bands fall on days.
    age_days = random.integers(0, 3000, n)
    subject = cohort_of(start, entry, exit, random.random(n) < 0.5, age_days / DAYS_PER_YEAR)
    year_scale, years = calendar_years(subject)
    age_edges = np.array([0, 1000, 2000, 3000]) / DAYS_PER_YEAR
    pieces = split(subject, [year_scale, ages(subject, age_edges)])
    assert pieces.days.sum() == pytest.approx(subject.person_days())
    slow = np.zeros((len(years), 4))
    for i in range(n):
        for day in range(entry[i], exit[i]):
            year = datetime.date.fromordinal(int(start[i]) + day).year
            slow[
                years.index(year), np.searchsorted([0, 1000, 2000, 3000], age_days[i] + day, side="right") - 1
            ] += 1
    fast = np.zeros_like(slow)
    np.add.at(fast, (pieces.band[0], pieces.band[1]), pieces.days)
    assert fast == pytest.approx(slow, abs=1e-6)
    died = subject.outcome == meaning_code("died_of_disease")
    rates = rates_by_band(subject, pieces, 0, len(years), DIED)
    assert sum(band.events for band in rates) == died.sum()


def test_unknown_age_is_left_out_and_no_age_refused() -> None:
    subject = cohort_of([735_000] * 2, [0, 0], [10, 20], [True, True], [30, np.nan])
    assert split(subject, [ages(subject, [0])]).days.sum() == 10
    without = Cohort(
        entry=subject.entry, exit=subject.exit, outcome=subject.outcome, start=subject.start, line=subject.line,
        closing=subject.closing,
    )  # fmt: skip
    with pytest.raises(Refusal) as refused:
        ages(without, [0])
    assert refused.value.code == "age_not_known"


def test_limits_of_a_ratio_solve_the_binomial_tails() -> None:
    """At the limits exactly 2.5 % of the binomial distribution lies beyond what was seen (SciPy)."""
    found = rate_ratio(15, 120.0, 8, 200.0)
    assert found.value == pytest.approx(15 / 120 / (8 / 200))

    def share(ratio: float) -> float:
        return ratio * 120 / (ratio * 120 + 200)

    assert bdtrc(14, 23, share(found.lower)) == pytest.approx(0.025, abs=1e-10)
    assert bdtr(15, 23, share(found.upper)) == pytest.approx(0.025, abs=1e-10)
    turned = rate_ratio(8, 200.0, 15, 120.0)
    assert (turned.lower, turned.upper) == pytest.approx((1 / found.upper, 1 / found.lower))
    assert rate_ratio(0, 10.0, 3, 10.0).lower == 0
    assert np.isinf(rate_ratio(3, 10.0, 0, 10.0).upper)


def band(events: int, years: float) -> BandRate:
    return BandRate(events, years, rate_ratio(1, 1, 1, 1))


def test_standardising_one_band_gives_the_crude_rate_and_garwoods_limits() -> None:
    found = standardise([band(10, 50.0)], [1])
    assert found.standardised.value == pytest.approx(0.2)
    assert (found.standardised.lower, found.standardised.upper) == pytest.approx(
        (found.crude.lower, found.crude.upper)
    )


def test_standardised_to_its_own_person_years_a_rate_stays_as_it_is() -> None:
    bands = [band(3, 30.0), band(8, 55.0), band(2, 15.0)]
    found = standardise(bands, [30, 55, 15])
    assert found.standardised.value == pytest.approx(found.crude.value)
    assert found.weight_used == pytest.approx(1)


def test_bands_nobody_lived_in_are_left_out() -> None:
    found = standardise([band(3, 30.0), band(0, 0.0)], [60, 40])
    assert found.standardised.value == pytest.approx(0.1)
    assert found.weight_used == pytest.approx(0.6)
    with pytest.raises(Refusal) as refused:
        standardise([band(0, 0.0)], [1])
    assert refused.value.code == "no_person_time"


def test_standards_have_a_weight_for_each_band() -> None:
    """The WHO weights sum to 100.035 as printed, Segi's to 100."""
    assert {len(weights) for weights in STANDARDS.values()} == {len(STANDARD_AGES)}
    assert sum(STANDARDS["who_world"]) == pytest.approx(100.035)
    assert sum(STANDARDS["segi"]) == pytest.approx(100)
