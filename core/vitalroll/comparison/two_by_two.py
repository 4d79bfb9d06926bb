"""Two groups, an outcome or none: risks, odds, and what stands between them."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np
from scipy.special import gammaln

from vitalroll.errors import Refusal
from vitalroll.numbers import NOT_GIVEN, Estimate, two_sided_z
from vitalroll.outcomes.limits import check_confidence


@dataclass(frozen=True)
class TwoByTwo:
    """Events among the exposed and among the reference group.

    Totals may be fractional (effective numbers of a life table); nothing exact can then be given.

    Raises
    ------
    Refusal
        ``negative_count`` or ``more_events_than_patients``, with the field.
    """

    exposed_events: float
    exposed_total: float
    reference_events: float
    reference_total: float

    def __post_init__(self) -> None:
        for side in ("exposed", "reference"):
            events, total = getattr(self, f"{side}_events"), getattr(self, f"{side}_total")
            if events < 0 or total < 0:
                raise Refusal("negative_count", field=f"{side}_events" if events < 0 else f"{side}_total")
            if events > total:
                raise Refusal("more_events_than_patients", field=f"{side}_events", events=events, total=total)

    @property
    def whole(self) -> bool:
        """Whether all four numbers are whole."""
        numbers = (self.exposed_events, self.exposed_total, self.reference_events, self.reference_total)
        return all(float(number).is_integer() for number in numbers)


@dataclass(frozen=True)
class Measures:
    """What a 2x2 table says. NaN stands where a value or a limit cannot be given.

    ``number_needed`` is 1 over the absolute risk difference: how many of the group in question for
    one outcome more or fewer.
    """

    exposed_risk: Estimate
    reference_risk: Estimate
    exposed_odds: float
    reference_odds: float
    risk_ratio: Estimate
    odds_ratio: Estimate
    risk_difference: Estimate
    number_needed: float


@dataclass(frozen=True)
class Exact:
    """The conditional odds ratio with exact limits, and exact two-sided p-values."""

    odds_ratio: Estimate
    p: float
    mid_p: float


def measures(table: TwoByTwo, *, confidence: float = 0.95) -> Measures:
    """Return the risks, odds, ratios and the difference of a 2x2 table.

    Returns
    -------
    Measures
        Risks with Wilson limits; risk ratio with Katz limits and odds ratio with Woolf limits, both
        symmetric on the log scale and given only where their cells are not empty; risk difference
        with Newcombe's hybrid score limits.

    References
    ----------
    Wilson (1927) JASA 22:209-212. Katz, Baptista, Azen & Pike (1978) Biometrics 34:469-474.
    Woolf (1955) Ann Hum Genet 19:251-253. Newcombe (1998) Stat Med 17:873-890, method 10.
    """
    check_confidence(confidence)
    z = two_sided_z(confidence)
    a, n1, c, n0 = table.exposed_events, table.exposed_total, table.reference_events, table.reference_total
    exposed, reference = wilson(a, n1, confidence), wilson(c, n0, confidence)
    difference = _newcombe(exposed, reference)
    return Measures(
        exposed_risk=exposed,
        reference_risk=reference,
        exposed_odds=_over(a, n1 - a),
        reference_odds=_over(c, n0 - c),
        risk_ratio=_log_scale(_over(a * n0, c * n1), [(1, a), (-1, n1), (1, c), (-1, n0)], z),
        odds_ratio=_log_scale(_over(a * (n0 - c), c * (n1 - a)), [(1, x) for x in (a, n1 - a, c, n0 - c)], z),
        risk_difference=difference,
        number_needed=_over(1.0, abs(difference.value)),
    )


def wilson(events: float, total: float, confidence: float = 0.95) -> Estimate:
    """Return a proportion with Wilson's score limits; NaN for a total of 0."""
    if total <= 0:
        return NOT_GIVEN
    z = two_sided_z(confidence)
    share = events / total
    centre = (share + z**2 / (2 * total)) / (1 + z**2 / total)
    margin = z * np.sqrt(share * (1 - share) / total + z**2 / (4 * total**2)) / (1 + z**2 / total)
    # At 0 and 1 the limit is exactly there; round-off must not put it beside.
    lower = 0.0 if events == 0 else float(centre - margin)
    upper = 1.0 if events == total else float(centre + margin)
    return Estimate(share, lower, upper, float(np.sqrt(share * (1 - share) / total)))


def _newcombe(exposed: Estimate, reference: Estimate) -> Estimate:
    value = exposed.value - reference.value
    below = np.hypot(exposed.value - exposed.lower, reference.upper - reference.value)
    above = np.hypot(exposed.upper - exposed.value, reference.value - reference.lower)
    error = np.hypot(exposed.standard_error, reference.standard_error)
    return Estimate(value, float(value - below), float(value + above), float(error))


def _log_scale(value: float, parts: list[tuple[int, float]], z: float) -> Estimate:
    """Return a ratio whose log has variance sum(sign / number); ``standard_error`` is that of the log."""
    if any(number <= 0 for _, number in parts):
        return Estimate(value, float("nan"), float("nan"))
    error = float(np.sqrt(sum(sign / number for sign, number in parts)))
    spread = np.exp(z * error)
    return Estimate(value, float(value / spread), float(value * spread), error)


def _over(numerator: float, denominator: float) -> float:
    return numerator / denominator if denominator > 0 else float("nan")


def exact(table: TwoByTwo, *, confidence: float = 0.95) -> Exact:
    """Return the conditional maximum-likelihood odds ratio with exact limits and p-values.

    Given all margins, the exposed events follow Fisher's noncentral hypergeometric distribution.

    Returns
    -------
    Exact
        Limits by inverting two one-sided tests. ``p`` adds the probabilities of all tables no more
        probable than the observed one; ``mid_p`` is twice the smaller tail, counting the observed
        table half.

    Raises
    ------
    Refusal
        ``exact_needs_whole_numbers`` for fractional totals.

    References
    ----------
    Fisher (1935); Cornfield (1956); Lancaster (1961) JASA 56:223-234 for mid-P.
    """
    check_confidence(confidence)
    if not table.whole:
        raise Refusal("exact_needs_whole_numbers")
    a, n1, n0 = int(table.exposed_events), int(table.exposed_total), int(table.reference_total)
    m = a + int(table.reference_events)
    support = np.arange(max(0, m - n0), min(n1, m) + 1)
    weight = _log_choose(n1, support) + _log_choose(n0, m - support)

    def chances(log_odds_ratio: float) -> np.ndarray:
        log = weight + support * log_odds_ratio
        shares = np.exp(log - log.max())
        return shares / shares.sum()

    at_one = chances(0.0)
    observed = at_one[support == a][0]
    beyond = at_one[support > a].sum(), at_one[support < a].sum()
    tail = (1 - confidence) / 2
    lowest, highest = a == support[0], a == support[-1]
    value = _solve(lambda b: (chances(b) * support).sum() - a, lowest, highest)
    lower = 0.0 if lowest else _solve(lambda b: chances(b)[support >= a].sum() - tail)
    upper = np.inf if highest else _solve(lambda b: tail - chances(b)[support <= a].sum())
    return Exact(
        odds_ratio=Estimate(value, lower, upper),
        # Tables exactly as probable as the observed one differ from it only by round-off.
        p=float(min(1.0, at_one[at_one <= observed * (1 + 1e-7)].sum())),
        mid_p=float(min(1.0, 2 * (min(beyond) + observed / 2))),
    )


def _log_choose(total: int, chosen: np.ndarray) -> np.ndarray:
    return gammaln(total + 1) - gammaln(chosen + 1) - gammaln(total - chosen + 1)


def _solve(rising, lowest: bool = False, highest: bool = False) -> float:
    """Return exp(b) where the rising function of b is zero, to the last bit of b."""
    if lowest and highest:
        return float("nan")
    if lowest:
        return 0.0
    if highest:
        return float("inf")
    below, above = -1.0, 1.0
    while rising(below) > 0:
        below *= 2
    while rising(above) < 0:
        above *= 2
    while True:
        middle = (below + above) / 2
        if middle in (below, above):
            return float(np.exp(middle))
        if rising(middle) < 0:
            below = middle
        else:
            above = middle
