"""Newcomers that grow or fall: a log-linear trend over the whole years, damped as it goes on."""

from __future__ import annotations

import datetime
import math
from dataclasses import dataclass, replace

import numpy as np

from vitalroll.caseload.inflow import OVERDISPERSED_ABOVE, Inflow
from vitalroll.errors import Caution, Refusal
from vitalroll.numbers import DAYS_PER_YEAR, Estimate, two_sided_z

FEWEST_YEARS_FOR_A_TREND = 3
_ENOUGH_STEPS = 50


@dataclass(frozen=True)
class Trend:
    """A log-linear trend of yearly newcomers.

    Parameters
    ----------
    level, slope : float
        Logarithm of the yearly number in the last whole year, and its change a year.
    covariance : float array, shape (2, 2)
        Of level and slope, widened by the overdispersion.
    damping : float
        What is left of the slope after each further year: 1 carries the trend on for ever, 0 stops it.
    gap : float
        Years from the end of the last whole year to the closing date.
    """

    level: float
    slope: float
    covariance: np.ndarray
    damping: float
    gap: float

    def distance(self, years: int) -> np.ndarray:
        """Return how many years of slope lie between the last whole year and each year ahead.

        With damping d and h years from middle to middle, the sum of d^i over i = 1 ... h, made
        continuous: d(1 - d^h)/(1 - d).
        """
        ahead = self.gap + np.arange(1.0, years + 1)
        if self.damping == 1:
            return ahead
        return self.damping * (1 - self.damping**ahead) / (1 - self.damping)

    def rates(self, years: int) -> np.ndarray:
        """Return the newcomers expected in each year ahead, shape (years,)."""
        return np.exp(self.level + self.slope * self.distance(years))

    def variances(self, years: int) -> np.ndarray:
        """Return the variance of the logarithm of ``rates``, shape (years,)."""
        at = np.stack((np.ones(years), self.distance(years)))
        return np.einsum("iy,ij,jy->y", at, self.covariance, at)

    def drawn_rates(self, draws: int, years: int, random: np.random.Generator) -> np.ndarray:
        """Draw level and slope and return rates (draws, years) whose mean is ``rates``."""
        root = np.linalg.cholesky(self.covariance + 1e-15 * np.eye(2))
        level, slope = root @ random.standard_normal((2, draws))
        moved = level[:, np.newaxis] + slope[:, np.newaxis] * self.distance(years)
        # The mean of exp(x) lies above the exp of the mean by half the variance.
        return self.rates(years) * np.exp(moved - self.variances(years) / 2)


def inflow_with_trend(
    inflow: Inflow, closing: int, *, damping: float = 0.8, confidence: float = 0.95
) -> Inflow:
    """Carry the trend of a history on, damped.

    Parameters
    ----------
    inflow : Inflow
        From ``inflow_from_history``.
    closing : int
        Ordinal of the closing date.
    damping : float
        From 0 to 1.

    Raises
    ------
    Refusal
        ``trend_history_too_short`` (whole_years, needed) with fewer than three whole years;
        ``out_of_range`` (newcomers.damping).

    Cautions
    --------
    Those of the history but for ``newcomers_trend``; ``trend_damped`` (percent_per_year, damping).

    References
    ----------
    Poisson regression of yearly counts on the year, by Newton's method; errors widened by
    Pearson's chi-squared over its degrees of freedom when above 1.5 (McCullagh & Nelder 1989, Generalized
    Linear Models, 2nd ed., ch. 6). Damping: Gardner ES, McKenzie E (1985) Manage Sci 31:1237-1246;
    Moller B et al. (2003) Stat Med 22:2751-2766 found that cancer counts were forecast better
    with the later trend halved.
    """
    if not 0 <= damping <= 1:
        raise Refusal("out_of_range", field="newcomers.damping", given=damping, least=0.0, greatest=1.0)
    whole = [year for year in inflow.years if year.whole]
    counts = np.array([year.count for year in whole], dtype=float)
    if len(whole) < FEWEST_YEARS_FOR_A_TREND or counts.sum() == 0:
        raise Refusal(
            "trend_history_too_short",
            field="newcomers.basis",
            whole_years=len(whole),
            needed=FEWEST_YEARS_FOR_A_TREND,
        )
    # Years are counted from the last one, so that the intercept is its level.
    years = np.array([year.year - whole[-1].year for year in whole], dtype=float)
    level, slope, information = _poisson_regression(years, counts)
    fitted = np.exp(level + slope * years)
    dispersion = float(np.sum((counts - fitted) ** 2 / fitted) / max(len(counts) - 2, 1))
    spread = dispersion if dispersion > OVERDISPERSED_ABOVE else 1.0
    end = datetime.date(whole[-1].year + 1, 1, 1).toordinal() - 1
    trend = Trend(level, slope, spread * np.linalg.inv(information), damping, (closing - end) / DAYS_PER_YEAR)
    first, wide = float(trend.rates(1)[0]), math.sqrt(float(trend.variances(1)[0]))
    z = two_sided_z(confidence)
    parameters = {"percent_per_year": 100 * math.expm1(slope), "damping": damping}
    return replace(
        inflow,
        per_year=Estimate(first, first * math.exp(-z * wide), first * math.exp(z * wide), first * wide),
        dispersion=dispersion,
        model="trend",
        trend=trend,
        cautions=(
            *(
                caution
                for caution in inflow.cautions
                if caution.code not in ("newcomers_trend", "newcomers_overdispersed")
            ),
            Caution("trend_damped", parameters),
        ),
    )


def _poisson_regression(years: np.ndarray, counts: np.ndarray) -> tuple[float, float, np.ndarray]:
    """Return intercept, slope and information of log E(count) = intercept + slope x year."""
    design = np.column_stack((np.ones_like(years), years))
    found = np.array([math.log(counts.mean()), 0.0])
    for _ in range(_ENOUGH_STEPS):
        fitted = np.exp(design @ found)
        information = design.T @ (design * fitted[:, np.newaxis])
        step = np.linalg.solve(information, design.T @ (counts - fitted))
        found = found + np.clip(step, -2, 2)
        if np.max(np.abs(step)) < 1e-12:
            return float(found[0]), float(found[1]), information
    # Counts that are none but in one end year have no finite slope.
    raise Refusal("trend_not_found", field="newcomers.basis")
