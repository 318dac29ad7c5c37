"""A second opinion on the measurement core, by scipy.

Computes random cases from the written rules of docs/measurement.md, not from the product's code, and
writes second-opinion.json, which second-opinion.test.ts compares with the product. Nothing here is
needed to run the tests. To make the file anew (Debian: apt-get install python3-scipy):

    /usr/bin/python3 tests/reference/second-opinion.py

Methods differ from the product's on purpose: the line by QR decomposition of the weighted design
matrix, the crossing's limits by Brent's root finding on exact rational arithmetic, probabilities by
scipy.stats.norm, the chi-squared limits by scipy.stats.chi2 rather than from a table.
"""

import json
import math
import pathlib
import random
from fractions import Fraction

import numpy
from scipy.linalg import qr, solve_triangular
from scipy.optimize import brentq
from scipy.stats import chi2, norm

CASES = 500
random.seed(20260301)


# --- A straight line through points of known uncertainty -------------------------------------------


def fit_line(points):
    x, y, u = (numpy.array(column) for column in zip(*points))
    design = numpy.column_stack([1 / u, x / u])
    q, r = qr(design, mode="economic")
    parameters = solve_triangular(r, q.T @ (y / u))
    inverse = solve_triangular(r, numpy.eye(2))
    covariance = inverse @ inverse.T
    residuals = y / u - design @ parameters
    return {
        "intercept": parameters[0],
        "slope": parameters[1],
        "uIntercept": math.sqrt(covariance[0, 0]),
        "uSlope": math.sqrt(covariance[1, 1]),
        "covariance": covariance[0, 1],
        "chiSquared": residuals @ residuals,
    }


def random_points():
    count = random.randint(3, 12)
    hours = sorted(random.sample(range(0, random.choice([300, 3000, 20000])), count))
    intercept, slope = random.uniform(0.8, 6), random.uniform(-0.02, 0.005)
    points = []
    for tenths in hours:
        u = round(random.choice([0.02, 0.05, 0.1, 0.3]) * random.uniform(0.5, 2), 4)
        delivered = intercept + slope * tenths / 10 + random.gauss(0, u)
        points.append([tenths / 10, round(delivered, 4), u])
    random.shuffle(points)
    return points


# --- Where that line meets a level, with Fieller's limits ------------------------------------------


def crossing(fit, level, k):
    a, b, ua, ub, cov, level, k = (Fraction(value) for value in (*fit, level, k))
    at = (level - a) / b
    if b * b <= (k * ub) ** 2:
        return [float(at), None, None]

    def excess(x):
        x = Fraction(x)
        return float((a + b * x - level) ** 2 - k * k * (ua * ua + 2 * x * cov + x * x * ub * ub))

    def limit(direction):
        inside, step = float(at), direction
        while excess(inside + step) <= 0:
            step *= 2
        return brentq(excess, inside, inside + step, xtol=1e-300, rtol=1e-15, maxiter=1000)

    return [float(at), limit(-1.0), limit(1.0)]


def random_crossing():
    fit = fit_line(random_points())
    line = [
        float("%.12g" % fit[key])
        for key in ("intercept", "slope", "uIntercept", "uSlope", "covariance")
    ]
    level = round(line[0] * random.uniform(0.7, 1.0), 4)
    k = random.choice([1.0, 1.645, 1.96, 3.0])
    return {"line": line, "level": level, "k": k, "crossing": crossing(line, level, k)}


# --- From checks to a verdict -----------------------------------------------------------------------

ALPHA = 0.6278 / 870


def at_15(volume, temperature):
    rise = temperature - 15
    return volume * math.exp(-ALPHA * rise * (1 + 0.8 * ALPHA * rise))


def syringe_tolerance(capacity, expelled):
    if expelled < capacity / 2:
        return 0.015 * capacity + (0.02 if capacity < 5 else 0.01) * expelled
    return (0.05 if capacity < 5 else 0.04) * expelled


def counts(run, sequence):
    """A run is void, of another length (over 20 %) or of another rhythm, or it counts."""
    if run.get("void"):
        return False
    if "deliveredMl" in run:
        return True
    if "seconds" in run and abs(run["seconds"] / sequence["seconds"] - 1) > 0.2:
        return False
    return run.get("rhythm", sequence["rhythm"]) == sequence["rhythm"]


def measure(check, sequence):
    """Section 1: a check as a delivery per run."""
    fills, open_at = [], None
    for run in check["runs"]:
        if not counts(run, sequence):
            open_at = None
        elif "deliveredMl" in run:
            fills.append([run["deliveredMl"]])
            open_at = None
        else:
            volume = run["endMl"] - run["startMl"]
            if open_at is not None and run["startMl"] == open_at:
                fills[-1].append(volume)
            else:
                fills.append([volume])
            open_at = run["endMl"]
    volumes = [volume for fill in fills for volume in fill]
    n = len(volumes)
    if n == 0:
        return None
    syringe = check["syringe"]
    g = syringe["graduationMl"] if syringe else 0.2
    mean = math.fsum(volumes) / n
    marks = g * g / 6 * (1 + 1 / n if len(fills) == 1 else 1)
    deviation, scatters = 0.02 * mean, False
    if n >= 2:
        observed = numpy.var(volumes, ddof=1)
        if observed > chi2.ppf(0.95, n - 1) / (n - 1) * (marks + (0.02 * mean) ** 2):
            deviation, scatters = math.sqrt(observed - marks), True
    known = "oilTempC" in check
    factor = at_15(1, check["oilTempC"] if known else 20)
    parts = [
        factor * math.sqrt(2 * len(fills)) * g / math.sqrt(12) / n,
        factor * deviation / math.sqrt(n),
        ALPHA * factor * mean * (1 if known else 10) / math.sqrt(3),
    ]
    tolerance = [
        syringe_tolerance(syringe["capacityMl"], sum(fill)) if syringe else 0.05 * sum(fill)
        for fill in fills
    ]
    return {
        "v": factor * mean,
        "u": math.sqrt(sum(part**2 for part in parts)),
        "scale": factor * sum(tolerance) / math.sqrt(3) / n,
        "syringe": syringe["id"] if syringe else None,
        "parts": parts,
        "scatter": deviation / mean,
        "scatters": scatters,
        "runs": n,
        "fills": len(fills),
    }


def pool(measured):
    """A session: the 1/u²-weighted mean of its checks."""
    if len(measured) == 1:
        return {**measured[0], "disagrees": False}
    ids = {one["syringe"] for one in measured}
    one_scale = len(ids) == 1 and None not in ids
    v = numpy.array([one["v"] for one in measured])
    scale = numpy.array([one["scale"] for one in measured])
    u = numpy.array([one["u"] for one in measured])
    if not one_scale:
        u = numpy.hypot(u, scale)
    mean = numpy.average(v, weights=u**-2.0)
    return {
        "v": mean,
        "u": 1 / math.sqrt(numpy.sum(u**-2.0)),
        "scale": numpy.average(scale, weights=u**-2.0) if one_scale else 0,
        "syringe": ids.pop() if one_scale else None,
        "disagrees": bool(
            numpy.sum(((v - mean) / u) ** 2) > chi2.ppf(0.95, len(measured) - 1)
        ),
    }


def compare(session, baseline):
    r = session["v"] / baseline["v"]
    same = session["syringe"] is not None and session["syringe"] == baseline["syringe"]
    relative = [
        math.hypot(one["u"], 0 if same else one["scale"]) / one["v"] for one in (session, baseline)
    ]
    return r, r * math.hypot(*relative)


def below(r, u, limit):
    return norm.cdf((limit - r) / u)


def runs_to_settle(session, baseline, last, syringe, act_limit):
    """The fewest further runs after which P(low) <= 0.05 or >= 0.95, the ratio unchanged."""

    def settled(u):
        r, u_r = compare({**session, "u": u}, baseline)
        return not 0.05 < below(r, u_r, act_limit) < 0.95

    if settled(session["u"]):
        return 0
    capacity = syringe["capacityMl"] if syringe else session["v"]
    g = syringe["graduationMl"] if syringe else 0.2
    per_fill = max(1, math.floor(0.95 * capacity / session["v"] + 1e-9))
    for n in range(1, 11):
        further = math.sqrt(
            2 * math.ceil(n / per_fill) * g * g / 12 / n**2
            + (last["scatter"] * session["v"]) ** 2 / n
            + last["parts"][2] ** 2
        )
        if settled(1 / math.sqrt(session["u"] ** -2 + further**-2)):
            return n
    return None


def judge(first, later, bike):
    """Sections 1 to 3, for a series of two sessions."""
    sequence = bike["sequence"]
    measured = [[measure(check, sequence) for check in checks] for checks in (first, later)]
    baseline, session = pool(measured[0]), pool(measured[1])
    r, u = compare(session, baseline)
    p_low, p_dropping = (below(r, u, 1 - bike[drop]) for drop in ("actDrop", "watchDrop"))
    if p_low >= 0.5:
        verdict, action = "low", "stop"
    else:
        verdict = "dropping" if p_dropping >= 0.5 else "holding"
        action = "repeat" if p_low > 0.05 or r - 1.645 * u > 1.15 else "ride"
    low_start = baseline["v"] < 0.85 * sequence["nominalMl"]
    settle = runs_to_settle(
        session, baseline, measured[1][-1], later[-1]["syringe"], 1 - bike["actDrop"]
    )
    return {
        "checks": [
            [one["v"], one["u"], one["scale"], *one["parts"], one["runs"], one["fills"]]
            + [int(one["scatters"])]
            for checks in measured
            for one in checks
        ],
        "disagree": [int(baseline["disagrees"]), int(session["disagrees"])],
        "baseline": [baseline["v"], baseline["u"], baseline["scale"]],
        "firstAction": "repeat" if low_start else "ride",
        "ratio": [r, u],
        "p": [p_low, p_dropping],
        "verdict": verdict,
        "action": action,
        "runsToSettle": settle,
    }


SYRINGES = [
    {"id": "a", "label": "2.5 mL", "capacityMl": 2.5, "graduationMl": 0.1},
    {"id": "b", "label": "5 mL", "capacityMl": 5, "graduationMl": 0.2},
    {"id": "c", "label": "10 mL", "capacityMl": 10, "graduationMl": 0.5},
    {"id": "d", "label": "10 mL, fine", "capacityMl": 10, "graduationMl": 0.1},
]
SEQUENCES = [
    {"seconds": 60, "rhythm": "steady", "nominalMl": 5.5},
    {"seconds": 30, "rhythm": "steady", "nominalMl": 3},
    {"seconds": 30, "rhythm": "alternating", "nominalMl": 1},
]


def random_run(run, sequence):
    """Now and then a run is void, of another kind, or carries its length and rhythm."""
    chance = random.random()
    if chance < 0.06:
        return {**run, "void": True}
    if chance < 0.12:
        return {**run, "seconds": round(sequence["seconds"] * random.choice([0.5, 0.7, 1.3, 2]))}
    if chance < 0.15:
        other = "steady" if sequence["rhythm"] == "alternating" else "alternating"
        return {**run, "rhythm": other}
    if chance < 0.3:
        length = round(sequence["seconds"] * random.uniform(0.85, 1.15), 1)
        return {**run, "seconds": length, "rhythm": sequence["rhythm"]}
    return run


def random_check(delivery, sequence, syringe, scatter):
    runs, level = [], 0.0
    step = (syringe["graduationMl"] if syringe else 0.2) / 2
    capacity = syringe["capacityMl"] if syringe else 1000
    for _ in range(random.randint(1, 6)):
        volume = max(step, random.gauss(delivery, scatter * delivery))
        if random.random() < 0.1:
            runs.append({"deliveredMl": round(volume, 2)})
            continue
        if level + volume > capacity or random.random() < 0.3:
            level = round(random.randint(0, 2) * step, 4)
        end = round(round((level + volume) / step) * step, 4)
        end = min(end, capacity * 1.1)
        runs.append(random_run({"startMl": level, "endMl": end}, sequence))
        level = end
    check = {"syringe": syringe, "runs": runs}
    if random.random() < 0.6:
        check["oilTempC"] = random.randint(0, 40)
    return check if measure(check, sequence) else random_check(delivery, sequence, syringe, scatter)


def random_session(delivery, sequence, syringe, scatter):
    checks = []
    for _ in range(random.choice([1, 1, 1, 2, 3])):
        other = random.random() < 0.15
        chosen = random.choice(fitting(sequence)) if other else syringe
        checks.append(random_check(delivery, sequence, chosen, scatter))
    return checks


def fitting(sequence):
    return [one for one in SYRINGES if one["capacityMl"] > 1.3 * sequence["nominalMl"]]


def random_chain():
    sequence = random.choice(SEQUENCES)
    act = random.choice([0.15, 0.15, 0.15, 0.12, 0.1])
    bike = {"sequence": sequence, "actDrop": act, "watchDrop": random.choice([0.08, 0.08, 0.05])}
    delivery = sequence["nominalMl"] * random.uniform(0.8, 1.1)
    scatter = random.choice([0.02, 0.02, 0.02, 0.15])
    syringe = random.choice([*fitting(sequence), *fitting(sequence), None])
    later = random.choice([syringe, syringe, syringe, *fitting(sequence), None])
    true_ratio = random.choice([random.uniform(0.6, 1.3), random.uniform(0.8, 0.95)])
    first = random_session(delivery, sequence, syringe, scatter)
    second = random_session(delivery * true_ratio, sequence, later, scatter)
    return {
        "bike": {**bike, "sequence": SEQUENCES.index(sequence)},
        "first": [compact_check(check) for check in first],
        "later": [compact_check(check) for check in second],
        "expect": judge(first, second, bike),
    }


# --- Writing it down --------------------------------------------------------------------------------


def compact(value):
    """12 digits are enough to agree to 1e-9."""
    if isinstance(value, dict):
        return {key: compact(inner) for key, inner in value.items()}
    if isinstance(value, (list, tuple)):
        return [compact(inner) for inner in value]
    if isinstance(value, (float, numpy.floating)):
        return float("%.12g" % value)
    return value


def compact_run(run):
    """[start, end] or [delivered] where there is no more to say of a run."""
    plain = list(run.values())
    return plain if set(run) in ({"startMl", "endMl"}, {"deliveredMl"}) else run


def compact_check(check):
    """A syringe as its place in the list of syringes."""
    syringe = None if check["syringe"] is None else SYRINGES.index(check["syringe"])
    return {**check, "syringe": syringe, "runs": [compact_run(run) for run in check["runs"]]}


def lines(cases):
    return "[\n" + ",\n".join(json.dumps(compact(c), separators=(",", ":")) for c in cases) + "\n]"


def main():
    line_cases = [random_points() for _ in range(CASES)]
    conformance = []
    for _ in range(CASES):
        u, limit = round(random.uniform(0.005, 0.2), 4), round(random.uniform(0.7, 1), 3)
        value = round(limit + u * random.uniform(-7, 7), 5)
        conformance.append([value, u, limit, norm.sf((limit - value) / u)])
    sections = {
        "syringes": SYRINGES,
        "sequences": SEQUENCES,
        "fitLine": [{"points": p, "fit": list(fit_line(p).values())} for p in line_cases],
        "crossing": [random_crossing() for _ in range(CASES)],
        "conformance": conformance,
        "chain": [random_chain() for _ in range(CASES)],
    }
    body = ",\n".join(f'"{name}": {lines(cases)}' for name, cases in sections.items())
    target = pathlib.Path(__file__).with_name("second-opinion.json")
    target.write_text("{\n" + body + "\n}\n", encoding="utf-8")


main()
