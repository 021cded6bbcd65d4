"""Four prescriptions with mpmath, as a yardstick for `leastterm compare`: fixed order, Pade in the coupling, plain
Borel-Pade with the principal value by residues and quadrature along a ray, Wynn's epsilon.
Usage: python3 compare.py DIGITS X c0 c1 c2 ..."""
import sys
import mpmath as mp

digits, x = int(sys.argv[1]), sys.argv[2]
mp.mp.dps = digits + 25


def number(text):
    return mp.mpf(text.split('/')[0]) / mp.mpf(text.split('/')[1]) if '/' in text else mp.mpf(text)


x = number(x)
c = [number(t) for t in sys.argv[3:]]
n = len(c)
L, M = (n - 1) // 2, n - 1 - (n - 1) // 2

print('fixed order', mp.nstr(mp.fsum(ck * x**k for k, ck in enumerate(c)), digits))

p, q = mp.pade(c, L, M)
print('pade', mp.nstr(mp.polyval(p[::-1], x) / mp.polyval(q[::-1], x), digits))

b = [ck / mp.factorial(k) for k, ck in enumerate(c)]
p, q = mp.pade(b, L, M)
ray = mp.expj(mp.pi / 8)
borel = mp.quad(
    lambda s: ray * mp.exp(-s * ray / x) / x * mp.polyval(p[::-1], s * ray) / mp.polyval(q[::-1], s * ray), [0, x, 4 * x, 16 * x, 80 * x]
)
print('borel-pade', mp.nstr(borel.real, digits), mp.nstr(borel.imag, digits))

sums, total = [], mp.mpf(0)
for k, ck in enumerate(c):
    total += ck * x**k
    sums.append(total)
before, row = [mp.mpf(0)] * (n + 1), sums
for _ in range(n - 1):
    step = []
    for k in range(len(row) - 1):
        d = row[k + 1] - row[k]
        step.append(before[k + 1] + (1 / d if d else mp.inf))
    before, row = row, step
    if len(row) == 1:
        break
print('epsilon', mp.nstr(row[0] if n % 2 else before[-1], digits))
