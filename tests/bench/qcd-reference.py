"""The same evolutions and the same rewriting with mpmath, timed; one JSON object on standard output."""
import json
import sys
import time

from mpmath import findroot, mp, mpf, quad, log, zeta, __version__


def beta(nf, loops):
    """b_k of da/dln mu^2 = -sum b_k a^(k+2), a = alpha_s/pi (five loops: arXiv:1606.08659)."""
    z3, z4, z5 = zeta(3), zeta(4), zeta(5)
    nf = mpf(nf)
    full = [
        11 - mpf(2) / 3 * nf,
        102 - mpf(38) / 3 * nf,
        mpf(2857) / 2 - mpf(5033) / 18 * nf + mpf(325) / 54 * nf**2,
        mpf(149753) / 6 + 3564 * z3 + nf * (-mpf(1078361) / 162 - mpf(6508) / 27 * z3)
        + nf**2 * (mpf(50065) / 162 + mpf(6472) / 81 * z3) + mpf(1093) / 729 * nf**3,
        mpf(8157455) / 16 + mpf(621885) / 2 * z3 - mpf(88209) / 2 * z4 - 288090 * z5
        + nf * (-mpf(336460813) / 1944 - mpf(4811164) / 81 * z3 + mpf(33935) / 6 * z4 + mpf(1358995) / 27 * z5)
        + nf**2 * (mpf(25960913) / 1944 + mpf(698531) / 81 * z3 - mpf(10526) / 9 * z4 - mpf(381760) / 81 * z5)
        + nf**3 * (-mpf(630559) / 5832 - mpf(48722) / 243 * z3 + mpf(1618) / 27 * z4 + mpf(460) / 9 * z5)
        + nf**4 * (mpf(1205) / 2916 - mpf(152) / 81 * z3),
    ]
    return [c / 4 ** (k + 1) for k, c in enumerate(full[:loops])]


def evolve(alpha, ratio, b):
    """alpha_s after a change of mu by ratio: the integral of 1/beta inverted by the secant rule."""
    a0 = mpf(alpha) / mp.pi
    goal = -2 * log(mpf(ratio))

    def gap(a):
        return quad(lambda x: 1 / (x * x * sum(c * x**k for k, c in enumerate(b))), [a0, a]) - goal

    start = a0 / (1 - b[0] * a0 * goal)
    return mp.pi * findroot(gap, (start, start * mpf("1.001")))


def product(a, b, n):
    out = [mpf(0)] * n
    for i, x in enumerate(a[:n]):
        for j, y in enumerate(b[: n - i]):
            out[i + j] += x * y
    return out


def rewrite(c, b, ratio):
    """Coefficients of x^(n+1) at mu' = ratio mu, b_k beyond five loops zero."""
    n = len(c)
    length = n + 1
    beta_series = ([mpf(0), mpf(0)] + [-x for x in b] + [mpf(0)] * length)[:length]
    f = [mpf(0), mpf(1)] + [mpf(0)] * (length - 2)
    total = f[:]
    weight = mpf(1)
    step = -2 * log(mpf(ratio))
    for k in range(1, length):
        f = product(beta_series, [x * (i + 1) for i, x in enumerate(f[1:])], length)
        weight = weight * step / k
        total = [s + weight * x for s, x in zip(total, f)]
    relation = total[1:]
    out = [mpf(0)] * n
    for coefficient in reversed(c):
        out = product(out, [mpf(0)] + relation, n)
        out[0] += coefficient
    return product(out, relation, n)


def timed(run, rounds=1):
    """Value and least CPU time of some rounds."""
    least = float("inf")
    for _ in range(rounds):
        start = time.process_time()
        value = run()
        least = min(least, time.process_time() - start)
    return value, least


def main():
    task = json.load(sys.stdin)
    mp.dps = 15
    b = beta(task["flavours"], 5)
    many, many_time = timed(lambda: [evolve(a, task["ratio"], b) for a in task["alphas"]])
    mp.dps = 50
    b = beta(task["flavours"], 5)
    one, one_time = timed(lambda: evolve(task["alphas"][0], task["ratio"], b), 5)
    rewritten, rewrite_time = timed(lambda: rewrite([mpf(x) for x in task["coefficients"]], b, task["factor"]), 5)
    json.dump(
        {
            "version": __version__,
            "many": [mp.nstr(x, 15) for x in many],
            "perValue": many_time / len(many),
            "one": mp.nstr(one, 50),
            "oneTime": one_time,
            "rewritten": [mp.nstr(x, 50) for x in rewritten],
            "rewriteTime": rewrite_time,
        },
        sys.stdout,
    )


main()
