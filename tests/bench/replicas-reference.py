"""The replicas of replicas.mjs in a plain mpmath loop at 15 digits: the same members, the same inputs, secant steps.

Reads a task from standard input, writes the values and the CPU seconds for each prescription."""
import json
import sys
import time

import mpmath
from mpmath import mp, mpc, mpf
from mpmath.calculus.quadrature import GaussLegendre

mp.dps = 15
task = json.load(sys.stdin)
settings = task["settings"]


def fixed_order(c, s):
    return lambda x: mpmath.polyval(list(reversed(c[: s["terms"]])), x)


def least_term(c, s):
    n = s["terms"]
    whole = fixed_order(c, s)
    return lambda x: whole(x) + (c[n] * x**n / 2 if s["half"] else 0)


def pade(c, s):
    p, q = mpmath.pade(c[: s["L"] + s["M"] + 1], s["L"], s["M"])
    return lambda x: mpmath.polyval(p[::-1], x) / mpmath.polyval(q[::-1], x)


def same(b, x):
    """F_b(x), principal value."""
    if b == 0:
        return mpmath.exp(-x) * mpmath.ei(x)
    total = -mpmath.hyp1f1(-b, 1 - b, x) / b - mpmath.gamma(-b) * x**b * mpmath.cospi(b)
    return mpmath.exp(-x) * total


def other(b, w):
    """G_b(w)."""
    return mpmath.exp(w) * mpmath.e1(w) if b == 0 else mpmath.hyperu(1, 1 - b, w)


def borel_pade(c, s):
    L, M, b = s["L"], s["M"], mpf(s["b"])
    t = [a / mpmath.rf(1 + b, n) for n, a in enumerate(c[: L + M + 1])]
    p, q = mpmath.pade(t, L, M)
    p, q = p[::-1], q[::-1]
    slope = [k * a for k, a in zip(range(len(q) - 1, 0, -1), q)]
    poles = []
    for z in mpmath.polyroots(q, maxsteps=100, extraprec=60):
        if mpmath.im(z) < 0:
            continue
        if abs(z) < s["innermost"]:
            return None
        poles.append((z, -mpmath.polyval(p, z) / (z * mpmath.polyval(slope, z))))

    def value(x):
        total = mpf(0)
        for z, a in poles:
            w = z / x
            if mpmath.im(z) == 0:
                total += mpmath.re(a) * w * same(b, w) if w > 0 else -mpmath.re(a) * w * other(b, -w)
                continue
            total += 2 * mpmath.re(-a * w * other(b, -w))
            if s["lift"] and mpmath.re(z) > 0 and abs(mpmath.arg(z)) < 0.6:
                jump = 2j * mpmath.pi / mpmath.gamma(1 + b) * w ** (1 + b) * mpmath.exp(-w) * a
                total += mpmath.re(jump)
        return mpmath.re(total)

    return value


TURN = mpc(21, 20) / 29
PANELS = [0, 0.25, 0.5, 1, 2, 4, 8, 16, 28, 48]


def ray_nodes():
    """Gauss-Legendre nodes on the panels, with the weights times e^{-r e^{i theta}} e^{i theta}: made once."""
    plain = GaussLegendre(mp).calc_nodes(3, mp.prec + 10)
    nodes = []
    for low, high in zip(PANELS, PANELS[1:]):
        half = mpf(high - low) / 2
        for z, weight in plain:
            r = low + half * (1 + z)
            nodes.append((r * TURN, half * weight * TURN * mpmath.exp(-r * TURN)))
    return nodes


RAY = ray_nodes()


def along_ray(f, x):
    return mpmath.re(sum((weight * f(x * t) for t, weight in RAY), mpf(0)))


def partial_pade(c, s):
    N = s["L"] + s["M"] + 1
    rest = [a / mpmath.factorial(n) for n, a in enumerate(c[:N])]
    for f in s["factors"]:
        row = [mpmath.binomial(f["exponent"], k) * (-1 / mpf(f["t"])) ** k for k in range(N)]
        rest = [sum(rest[j] * row[n - j] for j in range(n + 1)) for n in range(N)]
    p, q = mpmath.pade(rest, s["L"], s["M"])
    p, q = p[::-1], q[::-1]
    for z in mpmath.polyroots(q, maxsteps=100, extraprec=60):
        if abs(z) < s["innermost"]:
            return None

    def borel(t):
        value = mpmath.polyval(p, t) / mpmath.polyval(q, t)
        for f in s["factors"]:
            value *= (1 - t / f["t"]) ** (-f["exponent"])
        return value

    return lambda x: along_ray(borel, x)


def conformal(c, s):
    d = [sum(mpf(r) * a for r, a in zip(row, c)) for row in s["rows"]]
    d = d[::-1]
    a, b = s["left"], s["right"]

    def borel(t):
        left, right = mpmath.sqrt(1 + t * a["inverse"]), mpmath.sqrt(1 - t * b["inverse"])
        w = (left - right) / (left + right)
        return (1 + w) ** (-2 * a["exponent"]) * (1 - w) ** (-2 * b["exponent"]) * mpmath.polyval(d, w)

    return lambda x: along_ray(borel, x)


def model(c, s):
    at = lambda f: f["constant"] + sum(mpf(k) * a for k, a in zip(f["slopes"], c))
    strengths = [at(p["strength"]) for p in s["points"]]
    poly = [at(p) for p in s["polynomial"]][::-1]

    def value(x):
        total = mpmath.polyval(poly, x)
        for p, n in zip(s["points"], strengths):
            w = abs(p["t"]) / x
            for k, weight in enumerate([1] + p["corrections"]):
                b = mpf(p["exponent"]) - 1 - k
                total += n * weight * w * (same(b, w) if p["t"] > 0 else other(b, w))
        return total

    return value


MAKE = {
    "fixed-order": fixed_order,
    "least-term": least_term,
    "pade": pade,
    "borel-pade": borel_pade,
    "borel-leroy-pade": borel_pade,
    "borel-partial-pade": partial_pade,
    "borel-conformal": conformal,
    "singularity-model": model,
}


def solve(f, goal, start):
    def miss(alpha):
        x = alpha / mpmath.pi
        return x * f(x) - goal

    return mpmath.findroot(miss, (start, start * 1.02), solver="secant", tol=1e-20, verify=False)


seconds, values = {}, {}
for s, start in zip(settings, task["starts"]):
    before = time.process_time()
    found = []
    for measured, c in task["replicas"]:
        f = MAKE[s["kind"]]([mpf(a) for a in c], s)
        found.append(None if f is None else float(solve(f, mpf(measured), mpf(start))))
    seconds[s["kind"]] = time.process_time() - before
    values[s["kind"]] = found
print(json.dumps({"version": mpmath.__version__, "seconds": seconds, "values": values}))
