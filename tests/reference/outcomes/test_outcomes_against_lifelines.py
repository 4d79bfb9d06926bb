"""Survival, medians, follow-up, life-table counts and the leukaemia trial against lifelines.

On data sets that lifelines ships. Times are whole days in our tables, so those given in parts of a
year are multiplied up to whole numbers first, for both sides.
"""

import numpy as np
import pytest
from lifelines import KaplanMeierFitter, datasets
from lifelines.utils import median_survival_times, survival_table_from_events

from vitalroll.numbers import DAYS_PER_YEAR
from vitalroll.outcomes.actuarial import grouped_counts
from vitalroll.outcomes.follow_up import follow_up_curve
from vitalroll.outcomes.product_limit import product_limit
from vitalroll.outcomes.quantiles import time_quantile
from vitalroll.outcomes.risk_table import count_risk

DIED = ("died_of_disease",)

# Both sides multiply and sum the same terms, lifelines through logarithms: only round-off differs.
EXACT = 1e-11


def observations(name):
    """Return entry, exit (whole numbers) and whether the event happened."""
    frame = getattr(datasets, f"load_{name}")()
    columns = {
        "lung": ("time", "status", 1),
        "leukemia": ("t", "status", 1),
        "larynx": ("time", "death", 10),
        "gbsg2": ("time", "cens", 1),
        "waltons": ("T", "E", 1),
        "rossi": ("week", "arrest", 1),
        "kidney_transplant": ("time", "death", 1),
    }
    time, event, scale = columns[name]
    exit = np.round(frame[time].to_numpy(float) * scale).astype(int)
    assert exit == pytest.approx(frame[time].to_numpy(float) * scale), "nothing is lost in rounding"
    return np.zeros_like(exit), exit, frame[event].to_numpy(int)


def fitted(entry, exit, event):
    fitter = KaplanMeierFitter()
    fitter.fit(exit, event, entry=entry if entry.any() else None)
    return fitter


def compare(curve, fitter, *, where=None):
    """Survival on every day; log-log limits wherever survival is strictly between 0 and 1."""
    days = fitter.survival_function_.index.to_numpy()
    days = days[(days > 0) & (days <= curve.span.last_time)]
    limits = fitter.confidence_interval_.loc[days].to_numpy()
    survival = fitter.survival_function_.loc[days].to_numpy()[:, 0]
    found = [curve.at(day) for day in days]
    assert np.array([e.value for e in found]) == pytest.approx(survival, abs=EXACT)
    inside = (survival > 1e-9) & (survival < 1 - 1e-9)
    assert inside.sum() > 5
    assert np.array([e.lower for e in found])[inside] == pytest.approx(limits[inside, 0], abs=EXACT)
    assert np.array([e.upper for e in found])[inside] == pytest.approx(limits[inside, 1], abs=EXACT)


@pytest.mark.parametrize(
    "name", ["lung", "leukemia", "larynx", "gbsg2", "waltons", "rossi", "kidney_transplant"]
)
def test_curve_and_log_log_limits(name):
    """Many ties, heavy and light censoring."""
    entry, exit, event = observations(name)
    curve = product_limit(count_risk(entry, exit, event), DIED)
    fitter = fitted(entry, exit, event)
    compare(curve, fitter)
    table = fitter.event_table.loc[fitter.event_table.index > 0]
    rows = np.searchsorted(curve.time, table.index.to_numpy(), side="right") - 1
    assert curve.at_risk[rows].tolist() == table["at_risk"].tolist()


def test_curve_with_delayed_entry():
    """AIDS cohort: patients join the study W years after the start, at risk when entry < time.

    Years in thousandths, which is how finely the data set gives them.
    """
    frame = datasets.load_multicenter_aids_cohort_study()
    exit = np.round(frame["T"].to_numpy() * 1000).astype(int)
    entry = np.round(frame["W"].to_numpy() * 1000).astype(int)
    event = frame["D"].to_numpy(int)
    keep = entry < exit
    entry, exit, event = entry[keep], exit[keep], event[keep]
    assert (entry > 0).mean() > 0.5, "most came late"
    curve = product_limit(count_risk(entry, exit, event), DIED)
    assert not curve.span.restarts
    compare(curve, fitted(entry, exit, event))


def test_curve_of_split_follow_up():
    """Heart transplants: waiting ends, by leaving and entering again, at the operation."""
    frame = datasets.load_stanford_heart_transplants()
    entry = np.round(frame["start"].to_numpy() * 10).astype(int)
    exit = np.round(frame["stop"].to_numpy() * 10).astype(int)
    event = frame["event"].to_numpy(int)
    compare(product_limit(count_risk(entry, exit, event), DIED), fitted(entry, exit, event))


@pytest.mark.parametrize("name", ["lung", "gbsg2", "waltons", "larynx", "leukemia"])
def test_median_and_its_limits(name):
    """First time with S <= 0.5, as in lifelines; limits where the log-log limits cross one half."""
    entry, exit, event = observations(name)
    median = time_quantile(product_limit(count_risk(entry, exit, event), DIED))
    fitter = fitted(entry, exit, event)
    assert median.estimate.value * DAYS_PER_YEAR == pytest.approx(fitter.median_survival_time_)
    limits = median_survival_times(fitter.confidence_interval_).to_numpy()[0]
    found = np.array([median.estimate.lower, median.estimate.upper]) * DAYS_PER_YEAR
    assert found == pytest.approx(np.where(np.isinf(limits), np.nan, limits), nan_ok=True)


def test_reversed_curve():
    """Follow-up of the lung cancer patients.

    lifelines only swaps the indicator, which keeps those who died on a day at risk of being censored
    on it; moved half a day earlier, the deaths are out of the way as they are with us.
    """
    entry, exit, event = observations("lung")
    curve = follow_up_curve(count_risk(entry, exit, event), DIED)
    fitter = fitted(entry, np.where(event == 1, exit - 0.5, exit), 1 - event)
    days = np.unique(exit[event == 0])
    expected = fitter.survival_function_at_times(days).to_numpy()
    assert [curve.at(day).value for day in days] == pytest.approx(expected, abs=EXACT)


def test_leukaemia_trial():
    """Freireich et al. 1963, as lifelines ships it: medians 23 weeks on 6-MP and 8 on placebo.

    Both medians as in Gehan (1965) Biometrika 52:203-223, from memory.
    """
    frame = datasets.load_leukemia()
    medians = {}
    for arm, rows in frame.groupby("Rx"):
        exit, event = rows["t"].to_numpy(int), rows["status"].to_numpy(int)
        curve = product_limit(count_risk(np.zeros_like(exit), exit, event), DIED)
        medians[arm] = round(time_quantile(curve).estimate.value * DAYS_PER_YEAR, 9)
    assert medians == {0: 23, 1: 8}


@pytest.mark.parametrize("name", ["lung", "gbsg2", "kidney_transplant"])
def test_counts_of_the_life_table(name):
    """Who entered, died and was censored in each interval (from, to]."""
    entry, exit, event = observations(name)
    edges = np.arange(0, exit.max() + 91, 90)
    counts = grouped_counts(count_risk(entry, exit, event), DIED, edges)
    expected = survival_table_from_events(exit, event, collapse=True, intervals=edges.tolist())
    size = len(expected)
    assert counts.events[:size].tolist() == expected["observed"].astype(int).tolist()
    assert (counts.lost + counts.withdrawn)[:size].tolist() == expected["censored"].astype(int).tolist()
