"""Costs of mpmath for tests/bench/numerics.mjs: microseconds of single operations, seconds of the pipeline from exact
coefficients to the lateral Laplace sum of a Pade approximant. Reads a JSON task on standard input, writes JSON.
The work inside is warmed up, repeated in short batches, and the least batch counts."""
import json
import sys
import time

import mpmath
from mpmath import mp, mpf

OPERATIONS = {
    "multiply": lambda x, y, s: x * y,
    "divide": lambda x, y, s: x / y,
    "exp": lambda x, y, s: mp.exp(y),
    "log": lambda x, y, s: mp.log(x),
    "atan": lambda x, y, s: mp.atan(x),
    "gamma": lambda x, y, s: mp.gamma(x),
    "e1": lambda x, y, s: mp.e1(x),
    "incomplete gamma": lambda x, y, s: mp.gammainc(s, x),
}


def least(run, batch_seconds, batches):
    """Least seconds a call."""
    start = time.process_time()
    for warm in range(50):
        run(warm)
        if time.process_time() - start > 0.1:
            break
    count = max(1, min(20000, int(batch_seconds * (warm + 1) / max(1e-7, time.process_time() - start))))
    best = float("inf")
    for _ in range(batches):
        start = time.process_time()
        for i in range(count):
            run(i)
        best = min(best, (time.process_time() - start) / count)
    return best


def operations(task):
    out = {}
    for digits in task["digits"]:
        mp.dps = digits
        xs = [mp.sqrt(2) * (3 + mpf(i) / 7) for i in range(8)]
        ys = [mp.sqrt(3) * (1 + mpf(i) / 11) for i in range(8)]
        s = -mp.sqrt(5) / 7
        row = {}
        for name in task["operations"]:
            f = OPERATIONS[name]
            seconds = least(lambda i: f(xs[i & 7], ys[i & 7], s), task["batchSeconds"], task["batches"])
            row[name] = {"us": seconds * 1e6, "value": mp.nstr(f(xs[0], ys[0], s), 15)}
        out[str(digits)] = row
    return out


def pipeline(n, coefficients, x, digits):
    """[n/n] of sum b_k t^k, all its poles, PV and Im of int_0^oo e^-s (p/q)(x s) ds."""
    mp.dps = digits + int(5 * n) + 20
    b = [mpf(p) / mpf(q) for p, q in coefficients[: 2 * n + 1]]
    p, q = mp.pade(b, n, n)
    roots = mp.polyroots(q[::-1], maxsteps=400, extraprec=60 + 8 * n)
    slope = [k * q[k] for k in range(1, n + 1)]
    x = mpf(x[0]) / mpf(x[1])
    total = p[n] / q[n]
    # residues at full precision: the polynomials cancel
    residues = [mp.polyval(p[::-1], z) / mp.polyval(slope[::-1], z) for z in roots]
    mp.dps = digits + 15
    for z, residue in zip(roots, residues):
        # residue/(t - z): int e^-s/(x s - z) ds = (1/x) e^w E1(w) at w = -z/x, passing above a positive pole
        w = -z / x
        if abs(mp.im(z)) < mpf(10) ** (-digits) * abs(z) and mp.re(z) > 0:
            y = mp.re(z) / x
            total -= mp.re(residue) / x * mp.exp(-y) * (mp.ei(y) + mp.pi * 1j)
        else:
            total += residue / x * mp.exp(w) * mp.e1(w)
    return total


def main():
    task = json.load(sys.stdin)
    out = {"version": mpmath.__version__, "backend": mpmath.libmp.BACKEND, "operations": operations(task)}
    runs = {}
    coefficients = [(int(p), int(q)) for p, q in task["coefficients"]]
    x = [int(t) for t in task["x"]]
    for n in task["orders"]:
        best = float("inf")
        for _ in range(2 if n <= 20 else 1):
            start = time.process_time()
            value = pipeline(n, coefficients, x, task["pipelineDigits"])
            best = min(best, time.process_time() - start)
        runs[str(n)] = {"s": best, "re": mp.nstr(mp.re(value), 110), "im": mp.nstr(mp.im(value), 110)}
    out["pipeline"] = runs
    json.dump(out, sys.stdout)


main()
