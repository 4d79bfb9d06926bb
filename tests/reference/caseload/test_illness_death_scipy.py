"""The illness-death equation against SciPy's ODE solver, counting people instead of shares."""

from __future__ import annotations

import numpy as np
import pytest
from scipy import integrate

from vitalroll.caseload.illness_death import AgeGroup, district, step

GROUPS = [
    AgeGroup(0, 5000, 0.0, 0.0005, 0.004, 0.02),
    AgeGroup(15, 6000, 0.01, 0.002, 0.003, 0.015),
    AgeGroup(40, 4000, 0.05, 0.012, 0.008, 0.03),
    AgeGroup(60, 2500, 0.10, 0.02, 0.03, 0.08),
]
EDGES = np.array([0, 15, 40, 60, 90])


def _solved(born_well: float, born_ill: float, from_age: float, to_age: float) -> float:
    """Follow well and ill of one generation by the solver, across the edges of the age groups."""
    state, age = np.array([born_well, born_ill]), from_age
    for i in range(len(GROUPS)):
        end = min(to_age, EDGES[i + 1])
        if end <= age:
            continue
        rates = GROUPS[i]

        def flows(_: float, now: np.ndarray, rates: AgeGroup = rates) -> list[float]:
            well, ill = now
            new = rates.incidence * well
            return [-new - rates.mortality_well * well, new - rates.mortality_ill * ill]

        state = integrate.solve_ivp(flows, (age, end), state, rtol=1e-11, atol=1e-14, method="DOP853").y[
            :, -1
        ]
        age = end
    return state[1] / state.sum()


@pytest.mark.parametrize(("prevalence", "years"), [(0.0, 3.0), (0.3, 10.0), (0.9, 1.5)])
def test_one_step_is_exact(prevalence, years):
    solved = integrate.solve_ivp(
        lambda _, p: (1 - p) * (0.04 - p * 0.11),
        (0, years),
        [prevalence],
        rtol=1e-11,
        atol=1e-14,
        method="DOP853",
    )
    assert step(np.array(prevalence), 0.04, 0.11, years) == pytest.approx(solved.y[0, -1], rel=1e-9)


def test_the_steady_state_is_the_life_of_one_generation():
    found = district(GROUPS, last_age=90, years=1)
    for i, group in enumerate(found.groups):
        ages = np.arange(EDGES[i], EDGES[i + 1]) + 0.5
        shares = [_solved(1.0, 0.0, 0.0, age) for age in ages]
        # Exact within each year; only the solver's own error is left.
        assert group.steady_prevalence == pytest.approx(np.mean(shares), rel=1e-8)


def test_ten_years_on_everybody_is_ten_years_older():
    found = district(GROUPS, last_age=90, years=10)
    ill = np.zeros(len(GROUPS))
    for age in range(90):
        group = int(np.searchsorted(EDGES, age, side="right")) - 1
        people = GROUPS[group].population / (EDGES[group + 1] - EDGES[group])
        if age >= 10:
            before = GROUPS[int(np.searchsorted(EDGES, age - 10, side="right")) - 1].prevalence
            share = _solved(1 - before, before, age - 10 + 0.5, age + 0.5)
        else:
            share = _solved(1.0, 0.0, 0.0, age + 0.5)
        ill[group] += people * share
    np.testing.assert_allclose([group.ill[-1] for group in found.groups], ill, rtol=1e-8)
