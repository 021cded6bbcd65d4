"""Contour-improved sums and the Borel sum of the same moment with mpmath, timed; one JSON object on standard output."""
import json
import sys
import time

from mpmath import __version__, exp, factorial, gammainc, lu_solve, matrix, mp, mpc, mpf, odefun, pi, quad, rf, rgamma, zeta


def beta(loops):
    """b_k of da/dln mu^2 = -sum b_k a^(k+2), a = alpha_s/pi, three flavours (four loops: hep-ph/9701390)."""
    full = [mpf(9), mpf(64), mpf(3863) / 6, four_loops()]
    return [c / 4 ** (k + 1) for k, c in enumerate(full[:loops])]


def four_loops():
    z3, nf = zeta(3), mpf(3)
    return (
        mpf(149753) / 6 + 3564 * z3 - nf * (mpf(1078361) / 162 + mpf(6508) / 27 * z3)
        + nf**2 * (mpf(50065) / 162 + mpf(6472) / 81 * z3) + mpf(1093) / 729 * nf**3
    )


def circle(alpha, b):
    """The coupling on the upper half circle: da/dphi = -i sum b_k a^(k+2), by Taylor steps."""
    return odefun(lambda p, y: [-1j * sum(c * y[0] ** (k + 2) for k, c in enumerate(b))], 0, [mpc(mpf(alpha) / pi)])


def weight(phase, W):
    x = -phase
    return sum(w * x**m for m, w in enumerate(W))


def around(f, a, W):
    return quad(lambda p: (weight(exp(1j * p), W) * f(a(p)[0])).real, [0, pi], method="gauss-legendre", maxdegree=5) / pi


def improved(alpha, c, W, digits):
    mp.dps = digits + 5
    a = circle(alpha, beta(4))
    return around(lambda x: sum(mpf(k) * x ** (n + 1) for n, k in enumerate(c)), a, [mpf(w) for w in W])


def branch(p, sign, g, b1, b2, n):
    """Taylor coefficients of (p -+ u)^(-1-g) [1 + b1 (p -+ u) + b2 (p -+ u)^2]."""
    return [
        sign**k * (rf(1 + g, k) * p ** (-1 - g - k) + b1 * rf(g, k) * p ** (-g - k) + b2 * rf(g - 1, k) * p ** (1 - g - k))
        / factorial(k)
        for k in range(n)
    ]


def singularities(b):
    q, r2, r3 = b[1] / b[0], b[2] / b[0], b[3] / b[0]
    out = []
    for p, sign, c1 in ((mpf(1), -1, 0), (mpf(2), 1, -mpf(11) / 18), (mpf(3), 1, 0)):
        B1 = sign * (p / b[0]) * (q**2 - r2)
        B2 = B1**2 / 2 + sign * (p / (2 * b[0])) * (-(q**3) + 2 * q * r2 - r3)
        g = sign * p * b[1] / b[0] ** 2 + (0 if sign > 0 else 1)
        out.append((p, sign, g, sign * (B1 + c1) / (b[0] * g), (B2 + B1 * c1) / (b[0] ** 2 * g * (g - 1))))
    return out


def borel(alpha, c, W, digits):
    """Principal value: the model of arXiv:0806.3156, fitted and summed on the circle by incomplete gamma functions."""
    mp.dps = digits + 8
    b = beta(4)
    parts = singularities(b)
    n = len(c)
    columns = [branch(p, s, g, b1, b2, n) for p, s, g, b1, b2 in parts]
    M = matrix(n, n)
    for k in range(n):
        for i in range(3):
            M[k, i] = columns[i][k]
    for i in range(n - 3):
        M[i, 3 + i] = 1
    d = lu_solve(M, matrix([mpf(x) / factorial(k) / b[0] ** k for k, x in enumerate(c)]))

    def middle(x):
        total = sum(d[3 + k] * factorial(k) * (b[0] * x) ** (k + 1) for k in range(n - 3))
        for i, (p, s, g, b1, b2) in enumerate(parts):
            w = p / (b[0] * x)
            for j, co in enumerate((mpf(1), b1, b2)):
                e = g - j
                if s > 0:
                    kernel = -exp(-w) * (-w) ** e * gammainc(-e, -w) + 1j * pi * w**e * exp(-w) * rgamma(1 + e)
                else:
                    kernel = exp(w) * w**e * gammainc(-e, w)
                total += d[i] * co * p ** (-e) * kernel
        return total / b[0]

    return around(middle, circle(alpha, b), [mpf(w) for w in W])


def timed(run):
    before = time.process_time()
    value = run()
    return {"value": mp.nstr(value, 40), "seconds": time.process_time() - before}


task = json.load(sys.stdin)
alpha, c, W = task["alpha"], task["coefficients"], task["integral"]
print(json.dumps({
    "version": __version__,
    "doubles": timed(lambda: improved(alpha, c, W, 15)),
    "improved": timed(lambda: improved(alpha, c, W, 20)),
    "borel": timed(lambda: borel(alpha, c, W, 15)),
}))
