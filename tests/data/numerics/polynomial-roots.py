#!/usr/bin/env python3
"""Writes polynomial-roots.json: roots of integer polynomials to 60 digits, from mpmath, compared with PARI/GP.

Run: python3 polynomial-roots.py > polynomial-roots.json   (python3-mpmath, pari-gp)
"""
import json
import math
import subprocess
import sys
from fractions import Fraction

import mpmath
from mpmath import mp

mp.dps = 120


def product(roots):
    p = [1]
    for r in roots:
        q = [0] * (len(p) + 1)
        for i, c in enumerate(p):
            q[i + 1] += c
            q[i] -= r * c
        p = q
    return p


def wilkinson_perturbed():
    p = [c * 2**23 for c in product(range(1, 21))]
    p[19] -= 1
    return p


def scaled(fractions):
    den = 1
    for f in fractions:
        den = den * f.denominator // math.gcd(den, f.denominator)
    return [int(f * den) for f in fractions]


def bernoulli_polynomial(n):
    b = [Fraction(1)]
    for m in range(1, n + 1):
        b.append(-sum(Fraction(math.comb(m + 1, k)) * b[k] for k in range(m)) / (m + 1))
    return scaled([Fraction(math.comb(n, k)) * b[n - k] for k in range(n + 1)])


def truncated_exp(n):
    f, out = Fraction(1), []
    for k in range(n + 1):
        out.append(f)
        f /= k + 1
    return scaled(out)


def mignotte(n, a):
    p = [0] * (n + 1)
    p[n] = 1
    p[2] -= 2 * a * a
    p[1] += 4 * a
    p[0] -= 2
    return p


def lcg(n, seed):
    out, s = [], seed
    for _ in range(n + 1):
        s = (s * 6364136223846793005 + 1442695040888963407) % 2**64
        out.append((s >> 33) % 20001 - 10000)
    return out


CASES = {
    "Wilkinson's polynomial of degree 20 with 2^-23 taken from the coefficient of x^19": wilkinson_perturbed(),
    "Bernoulli polynomial of degree 20": bernoulli_polynomial(20),
    "first 25 terms of exp": truncated_exp(24),
    "Mignotte's x^10 - 2(100x - 1)^2, two real roots 1.4e-12 apart": mignotte(10, 100),
    "pseudo-random coefficients, degree 30": lcg(30, 2024),
}


def main():
    out = []
    for name, p in CASES.items():
        roots = mp.polyroots([mp.mpf(c) for c in reversed(p)], maxsteps=2000, extraprec=1200)
        gp = "default(realprecision,150); v=polroots(Pol(%s)); for(i=1,#v,print(real(v[i]),\" \",imag(v[i])))" % (
            str(list(reversed(p))).replace(" ", "")
        )
        text = subprocess.run(["gp", "-q", "-f"], input=gp + "\n", capture_output=True, text=True, check=True).stdout
        pari = [mp.mpc(*line.replace(" E", "E").split()) for line in text.strip().splitlines()]
        worst = max(min(abs(z - w) for w in pari) / abs(z) for z in roots)
        assert worst < mp.mpf(10) ** -100, (name, worst)
        rows = []
        for z in sorted(roots, key=lambda z: (abs(z), -mp.im(z))):
            im = mp.im(z) if abs(mp.im(z)) > mp.mpf(10) ** -90 * abs(z) else mp.mpf(0)
            rows.append([mp.nstr(mp.re(z), 60, strip_zeros=False), "0" if im == 0 else mp.nstr(im, 60, strip_zeros=False)])
        out.append({"name": name, "coefficients": [str(c) for c in p], "roots": rows})
    version = subprocess.run(["gp", "--version-short"], capture_output=True, text=True).stdout.strip()
    json.dump(
        {
            "generator": "polynomial-roots.py",
            "source": f"mpmath {mpmath.__version__} polyroots, agreeing to 100 digits with PARI/GP {version} polroots",
            "digits": 60,
            "polynomials": out,
        },
        sys.stdout,
        indent=1,
    )
    print()


main()
