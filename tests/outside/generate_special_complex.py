#!/usr/bin/env python3
"""Reference values for incomplete Gamma, hypergeometric and related functions: mpmath and PARI/GP, where the two agree.

Run:  python3 tests/outside/generate_special_complex.py > tests/outside/data/special-functions-complex.json
Needs python3-mpmath and gp. Points, comparison and digits as in generate_special.py, whose helpers are used. Both programs work
with more than 40 digits to spare, since neither says how much it loses; a point is kept when they agree to AGREE digits relative to
the modulus.
"""
import json
import random
import re
import subprocess
import sys

import mpmath
from mpmath import mp, mpf, mpc

import generate_special as base
from generate_special import AGREE, DIGITS, gp_number, parse

mp.dps = 110
base.rng = rng = random.Random(20260301)
dec, logdec = base.dec, base.logdec
FRACTIONS = ["1/3", "5/7", "-2/3", "32/81", "-32/81", "7/2", "-13/5", "1.000000001", "-0.999999999", "11/4", "3", "-2", "1", "0.25"]

PRELUDE = r"""
default(realprecision, 115);
show(z) = printf("%.90g %.90g\n", real(z), imag(z));
"""


def value(text):
    """Exact number or pair "re,im" at the current precision."""
    parts = text.split(",")
    return mpc(parse(parts[0]), parse(parts[1])) if len(parts) == 2 else parse(text)


def gp(text):
    parts = text.split(",")
    one = lambda t: f"({gp_number(t)}*1.)"
    return f"({one(parts[0])}+I*{one(parts[1])})" if len(parts) == 2 else one(text)


def whole(text):
    """An exact integer for PARI/GP where the text is one: its incomplete Gamma and U look for integers."""
    return text if "," not in text and parse(text) == mp.floor(parse(text)) else gp(text)


def point(low, high):
    """A point of the plane as "re,im", off the negative axis."""
    size, angle = logdec(low, high), dec("-3", "3")
    with mp.workdps(30):
        re_, im = parse(size) * mp.cos(parse(angle)), parse(size) * mp.sin(parse(angle))
        return f"{mp.nstr(re_, 18, strip_zeros=False)},{mp.nstr(im, 18, strip_zeros=False)}"


def cases():
    """Yields (function, inputs, mpmath value, PARI/GP expression)."""
    pick = lambda i: FRACTIONS[i % len(FRACTIONS)]
    for i in range(104):
        x = (dec(-20, 20), logdec("1e-12", "30"), dec(-1, 1))[i % 3]
        for name in ("sinh", "cosh", "tanh"):
            yield name, {"x": x}, lambda x=x, name=name: getattr(mp, name)(parse(x)), f"{name}({gp(x)})"
        s = (dec("1.05", 40), dec(-30, "0.95"), dec("0.5", "1.5"), "1." + "0" * (i % 20) + "1")[i % 4]
        yield "zetaReal", {"s": s}, lambda s=s: mp.zeta(parse(s)), f"zeta({gp(s)})"
        y, s = logdec("0.05", "60"), pick(i) if i % 2 else dec(-8, 8, 12)
        yield "upperGamma", {"s": s, "x": y}, lambda s=s, y=y: mp.gammainc(parse(s), parse(y)), f"incgam({whole(s)},{gp(y)})"
        z = point("0.05", "40")
        yield ("upperGammaComplex", {"s": s, "z": z}, lambda s=s, z=z: mp.gammainc(parse(s), value(z)),
               f"incgam({whole(s)},{gp(z)})")
        s2 = f"{dec(-6, 6, 10)},{dec(-4, 4, 10)}" if i % 4 else f"{-(i % 7)},{logdec('1e-15', '0.2', 8)}"
        yield ("upperGammaOrder", {"s": s2, "z": z}, lambda s=s2, z=z: mp.gammainc(value(s), value(z)),
               f"incgam({gp(s2)},{gp(z)})")
        w = f"{dec(-8, 12)},{logdec('0.01', '8')}"
        yield "gammaComplex", {"z": w}, lambda z=w: mp.gamma(value(z)), f"gamma({gp(w)})"
        right = w.lstrip("-")  # digamma of mpmath 1.2.1 does not return on some points of the left half-plane
        yield "digammaComplex", {"z": right}, lambda z=right: mp.digamma(value(z)), f"psi({gp(right)})"
        a, b = pick(i), pick(3 * i + 1) if i % 3 else dec(-4, 6, 10)
        z = point("0.1", "40") if i % 2 else dec(-40, 40)
        if not (base.is_integer(b) and parse(b) <= 0):
            yield ("kummerM", {"a": a, "b": b, "z": z}, lambda a=a, b=b, z=z: mp.hyp1f1(parse(a), parse(b), value(z)),
                   f"hypergeom([{gp(a)}],[{gp(b)}],{gp(z)})")
        u = (logdec("0.1", "100"), point("0.2", "40"))[i % 2]
        yield ("kummerU", {"a": a, "b": b, "z": u}, lambda a=a, b=b, z=u: mp.hyperu(parse(a), parse(b), value(z)),
               f"hyperu({gp(a)},{gp(b)},{gp(u)})")
        c = ["5/7", "11/4", "17/6", "4", "-1/6", dec("0.2", 5, 8)][i % 6]
        z = (dec(-8, "0.97"), point("0.05", "0.7"), dec(-1, 1), point("1.5", "20"))[i % 4]
        yield ("gauss", {"a": a, "b": pick(5 * i + 2), "c": c, "z": z},
               lambda a=a, b=pick(5 * i + 2), c=c, z=z: mp.hyp2f1(parse(a), parse(b), parse(c), value(z)),
               f"hypergeom([{gp(a)},{gp(pick(5 * i + 2))}],[{gp(c)}],{gp(z)})")
    for i in range(24):
        y, s = logdec("1e-10", "10"), f"{-(i % 8)}.{'0' * (i % 12)}1"
        yield "upperGamma", {"s": s, "x": y}, lambda s=s, y=y: mp.gammainc(parse(s), parse(y)), f"incgam({gp(s)},{gp(y)})"
    # U at integer b, and more points where one of the programs fails elsewhere.
    for i in range(60):
        a, b, u = dec("0.1", 4, 8), str(i % 9 - 3), logdec("0.1", "40")
        yield ("kummerU", {"a": a, "b": b, "z": u}, lambda a=a, b=b, z=u: mp.hyperu(parse(a), parse(b), parse(z)),
               f"intnum(t=[0,{a}-1],[oo,{u}],exp(-{gp(u)}*t)*t^({gp(a)}-1)*(1+t)^({gp(b)}-{gp(a)}-1))/gamma({gp(a)})")
        a, b, m = dec("-2", 3, 8), dec("-2", 3, 8), i % 5
        with mp.workdps(40):
            c = mp.nstr(parse(a) + parse(b) + m, 20, strip_zeros=False)
        z = dec("0.76", "0.99")
        yield ("gauss", {"a": a, "b": b, "c": c, "z": z},
               lambda a=a, b=b, c=c, z=z: mp.hyp2f1(parse(a), parse(b), parse(c), parse(z)),
               f"hypergeom([{gp(a)},{gp(b)}],[{gp(c)}],{gp(z)})")
        u = (logdec("0.1", "100"), dec("0.1", 30))[i % 2]
        yield ("kummerM", {"a": a, "b": "32/81", "z": u}, lambda a=a, z=u: mp.hyp1f1(parse(a), mpf(32) / 81, parse(z)),
               f"hypergeom([{gp(a)}],[32/81*1.],{gp(u)})")


def main():
    functions, dropped = {}, {}
    wanted = list(cases())
    script = PRELUDE + "".join(f'iferr(show({e}), E, print("error"));\n' for _, _, _, e in wanted)
    run = subprocess.run(["gp", "-q", "-s", "1G"], input=script, capture_output=True, text=True, check=True)
    lines = run.stdout.strip().split("\n")
    assert len(lines) == len(wanted), (len(lines), len(wanted), run.stderr[:500])
    version = subprocess.run(["gp", "--version-short"], capture_output=True, text=True, check=True).stdout.strip()
    print("PARI/GP done", file=sys.stderr, flush=True)
    for (name, inputs, evaluate, _), line in zip(wanted, lines):
        try:
            theirs = mpc(*[mpf(t) for t in re.sub(r"\s+[eE]", "e", line).split()])
            ours = mpc(evaluate())
            size = abs(ours)
            agree = size > 0 and abs(ours - theirs) <= mpf(10) ** -AGREE * size
        except Exception:
            agree = False
        if not agree:
            dropped[name] = dropped.get(name, 0) + 1
            continue
        text = lambda v: mp.nstr(v, DIGITS, strip_zeros=False)
        functions.setdefault(name, []).append({**inputs, "re": text(ours.real), "im": text(ours.imag)})
    json.dump({
        "about": "Reference values on which mpmath and PARI/GP agree; written by tests/outside/generate_special_complex.py.",
        "versions": {"mpmath": mpmath.__version__, "pari-gp": version, "python": sys.version.split()[0]},
        "digits": DIGITS,
        "agreement": f"1e-{AGREE} relative to the modulus",
        "dropped": dropped,
        "functions": functions,
    }, sys.stdout, indent=1)
    print()
    print({k: len(v) for k, v in functions.items()}, dropped, file=sys.stderr)


if __name__ == "__main__":
    main()
