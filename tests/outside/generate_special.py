#!/usr/bin/env python3
"""Reference values for the special functions: mpmath and PARI/GP, only where the two agree.

Run:  python3 tests/outside/generate_special.py > tests/outside/data/special-functions.json
Needs python3-mpmath and gp (Debian packages python3-mpmath, pari-gp).

Every point is evaluated by mpmath and by PARI/GP, for the kernels by different methods: F_b by quadrature on a rotated
contour (mpmath) against the convergent series (PARI/GP); G_b and its complex continuation by Tricomi's U or quadrature (mpmath)
against the incomplete gamma function (PARI/GP). A point is kept when the two agree to AGREE digits (relative, for
complex values relative to the modulus); DIGITS digits of the mpmath value are written.
"""
import json
import random
import re
import subprocess
import sys

import mpmath
from mpmath import mp, mpf, mpc

DIGITS = 66
AGREE = 63
mp.dps = 100
rng = random.Random(20240611)

GP_PRELUDE = r"""
default(realprecision, 115);
FS(b, x, m) = {
  my(s = 0., t = 1., k = 0, eps = 10.^-(115 + x));
  while (k <= x + 5 || k <= b + 2 || abs(t) > eps,
    if (k == m, s += t*(log(x) - psi(k + 1.)), s += t/(k - b));
    k++; t = t*x/k);
  s
};
F(b, x, isint, m) = {
  my(s);
  localprec(115 + ceil(x) + 60);
  s = FS(b, x, if(isint, m, -1));
  if (!isint, s -= gamma(-b)*x^b*cos(Pi*b));
  exp(-x)*s
};
FI(b, x) = if (b == floor(b) && b < 0, 0., Pi*x^b*exp(-x)/gamma(1 + b));
G(b, w) = { localprec(115 + 2*ceil(abs(w)) + 60); exp(w)*w^b*incgam(-b, w) };
E(w) = { localprec(115 + 2*ceil(abs(w)) + 60); exp(w)*eint1(w) };
show(z) = printf("%.90g %.90g\n", real(z), imag(z));
"""


def dec(low, high, digits=20):
    """Random decimal between low and high, as a string."""
    return mp.nstr(mpf(low) + (mpf(high) - mpf(low)) * mpf(rng.random()), digits, strip_zeros=False)


def logdec(low, high, digits=20):
    return mp.nstr(mp.exp(mp.log(low) + (mp.log(high) - mp.log(low)) * mpf(rng.random())), digits, strip_zeros=False)


def parse(text):
    """Exact decimal, evaluated at the current precision."""
    if "/" in text:
        p, q = text.split("/")
        return mpf(p) / mpf(q)
    return mpf(text)


def gp_number(text):
    """An exact rational in PARI/GP syntax, forced to a real of the current precision where it is used."""
    if "/" in text:
        return f"({text})"
    sign = "-" if text.startswith("-") else ""
    body = text.lstrip("-")
    mantissa, _, exponent = body.partition("e")
    whole, _, frac = mantissa.partition(".")
    e = int(exponent or 0) - len(frac)
    digits = str(int(whole + frac))
    return f"({sign}{digits}*10^({e}))"


def is_integer(text):
    return parse(text) == mp.floor(parse(text))


def rotated(b, x):
    """S_+ = int e^{-xv} (1-v)^{-1-b} dv along v = s e^{i phi}, above the singularity: F_b + i Im."""
    with mp.workdps(110):
        turn = mp.expjpi(mpf(1) / 4)
        scale = 1 / x
        cut = 115 * mp.log(10) * mp.sqrt(2)
        nodes = [0, mpf(1) / 2, 1, 2, 4, 8, 16, 32, 64, 128, 256, cut + 40]
        points = sorted({mpf(0), mpf(1)} | {n * scale for n in nodes})
        f = lambda s: turn * mp.exp(-x * s * turn) * mp.power(1 - s * turn, -1 - b)
        return mp.quad(f, points)


def f_mp(b, x):
    if abs(b) <= 12:
        return rotated(b, x)
    # Large |b|: confluent function, sum_k x^k/(k!(k-b)) = -1F1(-b; 1-b; x)/b.
    with mp.workdps(130 + int(x)):
        pv = mp.exp(-x) * (-mp.hyp1f1(-b, 1 - b, x) / b - mp.gamma(-b) * x**b * mp.cospi(b))
        return mpc(pv, mp.pi * x**b * mp.exp(-x) * mp.rgamma(1 + b))


def g_mp(b, w):
    with mp.workdps(120 + int(2 * abs(w))):
        if mp.isint(b):
            return mp.exp(w) * mp.expint(1 + b, w)
        return mp.hyperu(1, 1 - b, w)


def e1_mp(w):
    with mp.workdps(120 + int(2 * abs(w))):
        return mp.exp(w) * mp.e1(w)


EXPONENTS = ["0", "1", "2", "5", "-1", "0.3951", "32/81", "128/81", "0.21", "-0.79", "-0.37", "2.37037", "1.5", "-2.5", "7.25",
             "1.000000001", "0.999999999", "2.000000000000000000001", "-0.000000000001", "11.37"]
LARGE = ["30.25", "57.5", "100.3951", "200.3951", "299.21", "-20.3", "-77.77"]


def cases():
    """Yields (function, input dict, mpmath value, PARI/GP expression)."""
    real = lambda name, x, mpf_, gpf: (name, {"x": x}, lambda: mpf_(parse(x)), f"{gpf}({gp_number(x)}*1.)")
    for i in range(108):
        x = (dec(-30, 30), logdec("1e-12", "1e6"), dec(-1, 1))[i % 3]
        yield real("exp", x if i % 3 != 1 else logdec("1e-12", "1e3"), mp.exp, "exp")
        yield real("sin", x, mp.sin, "sin")
        yield real("cos", x, mp.cos, "cos")
        yield real("atan", x, mp.atan, "atan")
        y = (logdec("1e-20", "1e20"), dec("0.9", "1.1"), logdec("1e-3", "1e3"))[i % 3]
        yield real("log", y, mp.log, "log")
        g = (dec("0.01", 30), dec(-20, 0), logdec("1e-8", "1e3"))[i % 3]
        yield real("gamma", g, mp.gamma, "gamma")
        yield real("digamma", g, lambda t: mp.digamma(t), "psi")
        p = (dec("0.01", 30), logdec("1e-8", "1e6"), dec("0.8", "2.2"))[i % 3]
        yield real("logGamma", p, mp.loggamma, "lngamma")
    for n in range(2, 106):
        yield ("zeta", {"n": n}, lambda n=n: mp.zeta(n), f"zeta({n})")
    for i in range(150):
        b = EXPONENTS[i % len(EXPONENTS)] if i < 100 else LARGE[i % len(LARGE)] if i < 130 else dec(-4, 8, 18)
        x = logdec("0.05", "60") if i < 100 or i >= 130 else logdec("1", "200")
        isint, m = (1, int(parse(b))) if is_integer(b) and parse(b) >= 0 else (0, 0)
        gb, gx = (b if is_integer(b) else gp_number(b)), f"{gp_number(x)}*1."
        yield ("branchSame", {"b": b, "x": x}, lambda b=b, x=x: f_mp(parse(b), parse(x)),
               f"F({gb},{gx},{isint},{m}) + I*FI({gb},{gx})")
        if i < 110:
            yield ("eiScaled", {"x": x}, lambda x=x: mp.exp(-parse(x)) * mp.ei(parse(x)), f"F(0,{gx},1,0)")
        yield ("branchAlternating", {"b": b, "x": x}, lambda b=b, x=x: g_mp(parse(b), parse(x)), f"G({gb},{gx})")
    for i in range(140):
        size, angle = logdec("0.05", "120"), dec("-3.14", "3.14")
        if i % 4 == 0:
            angle = dec("3.0", "3.1415")
        with mp.workdps(30):
            wr = mp.nstr(parse(size) * mp.cos(parse(angle)), 20, strip_zeros=False)
            wi = mp.nstr(parse(size) * mp.sin(parse(angle)), 20, strip_zeros=False)
        w = lambda wr=wr, wi=wi: mpc(parse(wr), parse(wi))
        gw = f"({gp_number(wr)}*1. + I*{gp_number(wi)}*1.)"
        yield ("scaledE1", {"wr": wr, "wi": wi}, lambda w=w: e1_mp(w()), f"E({gw})")
        b = EXPONENTS[i % len(EXPONENTS)]
        isint = is_integer(b)
        gb = str(int(parse(b))) if isint else gp_number(b)
        yield ("branchCut", {"b": b, "wr": wr, "wi": wi}, lambda b=b, w=w: g_mp(parse(b), w()), f"G({gb},{gw})")


def main():
    wanted = list(cases())
    script = GP_PRELUDE + "".join(f'iferr(show({gp}), e, print("error"));\n' for _, _, _, gp in wanted)
    run = subprocess.run(["gp", "-q", "-s", "512M"], input=script, capture_output=True, text=True, check=True)
    lines = run.stdout.strip().split("\n")
    assert len(lines) == len(wanted), (len(lines), len(wanted), run.stderr[:500])
    version = subprocess.run(["gp", "--version-short"], capture_output=True, text=True, check=True).stdout.strip()
    functions, dropped = {}, {}
    for (name, inputs, evaluate, _), line in zip(wanted, lines):
        ours = mpc(evaluate())
        try:
            theirs = mpc(*[mpf(t) for t in re.sub(r"\s+[eE]", "e", line).split()])
        except Exception:
            dropped[name] = dropped.get(name, 0) + 1
            continue
        complex_value = name in ("scaledE1", "branchCut")
        size = abs(ours)
        parts = [(ours.real, theirs.real), (ours.imag, theirs.imag)]
        limit = mpf(10) ** -AGREE
        if complex_value:
            ok = all(abs(p - q) <= limit * size for p, q in parts)
        else:
            ok = all(abs(p - q) <= limit * abs(p) for p, q in parts if name == "branchSame" or p is parts[0][0])
        if not ok:
            dropped[name] = dropped.get(name, 0) + 1
            print("disagree", name, inputs, mp.nstr(ours, 20), mp.nstr(theirs, 20), file=sys.stderr)
            continue
        text = lambda v: mp.nstr(v, DIGITS, strip_zeros=False)
        if name == "branchSame":
            value = {"pv": text(ours.real), "im": text(ours.imag)}
        elif complex_value:
            value = {"re": text(ours.real), "im": text(ours.imag)}
        else:
            value = {"value": text(ours.real)}
        functions.setdefault(name, []).append({**inputs, **value})
    json.dump({
        "about": "Reference values on which mpmath and PARI/GP agree; written by tests/outside/generate_special.py.",
        "versions": {"mpmath": mpmath.__version__, "pari-gp": version, "python": sys.version.split()[0]},
        "digits": DIGITS,
        "agreement": f"relative 1e-{AGREE}; complex values relative to their modulus",
        "dropped": dropped,
        "functions": functions,
    }, sys.stdout, indent=1)
    print()
    print({k: len(v) for k, v in functions.items()}, dropped, file=sys.stderr)


if __name__ == "__main__":
    main()
