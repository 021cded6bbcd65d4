"""Principal values of bubble chains with mpmath: rotated Borel contours, timed; one JSON object on standard output."""
import json
import sys
import time

import mpmath as m
from mpmath import mp, mpf

GL = dict(method="gauss-legendre")


def beta0(nf):
    return (11 - 2 * mpf(nf) / 3) / (4 * mp.pi)


def adler(u):
    w = 1 - u

    def t(x):
        # psi(1, x) by reflection where Re x < 0: mpmath does not always return there
        if m.re(x) < 0.25:
            return -m.psi(1, 1 - x) + (mp.pi / m.sin(mp.pi * x)) ** 2
        return m.psi(1, x)

    s = (t((2 - w) / 2) - t((3 - w) / 2) - t((2 + w) / 2) + t((3 + w) / 2)) / (16 * w)
    return mpf(32) / 3 / (2 - u) * s


def circle(u):
    return adler(u) * m.sin(mp.pi * u) / (mp.pi * u)


def tau(u):
    return circle(u) * 12 / ((1 - u) * (3 - u) * (4 - u))


def sum_rule(u):
    return (3 + u) / ((1 - u * u) * (1 - u * u / 4)) / 3


def potential(u):
    return 1 / (m.cos(mp.pi * u) * m.gamma(1 + 2 * u))


def mass_main(u):
    return 6 * (1 - u) * m.gamma(u) * m.gamma(1 - 2 * u) * m.rgamma(3 - u) / 4


def subtraction(count):
    def g(u):
        return -(3 + 2 * u) / 3 * m.gamma(4 + 2 * u) * m.rgamma(1 - u) * m.rgamma(2 + u) ** 2 * m.rgamma(3 + u)

    size = 2 * count
    values = [g(m.expjpi(mpf(2) * j / size)) for j in range(size)]
    return [m.fsum(values[j] * m.expjpi(-mpf(2) * j * n / size) for j in range(size)).real / size for n in range(count)]


def width(u):
    """Real emission through a recursion for 3F2 from far left; virtual part through Gamma and psi."""
    steps = int(mp.dps * 1.8) + 20 + int(max(0, m.re(u))) + int(abs(m.im(u)))
    v = u - steps
    h, hp = mpf(1) + 1 / (2 - v) ** 2, 2 / (2 - v) ** 3
    for _ in range(steps):
        d = 2 * (v - 1) ** 2 * (2 * v + 1)
        al = v**3 / d
        dal = al * (3 / v - 2 / (v - 1) - 2 / (2 * v + 1))
        h, hp = al * h + 3 * v / (2 * (2 * v + 1)), dal * h + al * hp + mpf(3) / 2 / (2 * v + 1) ** 2
        v = v + 1
    ref = -m.gamma(1 + u) * m.gamma(-2 * u) * m.rgamma(1 - u) / u

    def psim(x):
        return m.psi(0, 1 + x) + mp.pi * m.cot(mp.pi * x) if m.re(x) > 0 else m.psi(0, -x)

    q = (u - 4) * (u - 2) * (u - 1)
    c_x = 64 * u * (u + 1) * (2 * u - 1) / q
    c_0 = 4 * u * (9 * u**3 - 103 * u**2 - 14 * u + 62) / (3 * q)
    top = 9*u**9 - 238*u**8 + 1772*u**7 - 5974*u**6 + 10317*u**5 - 9096*u**4 + 3658*u**3 - 760*u**2 + 504*u - 288
    r0 = 2 * top / (3 * u**3 * (u - 4) * (u - 3) * (u - 2) ** 3 * (u - 1) ** 3)
    r1 = -2 * (9*u**5 - 184*u**4 + 569*u**3 - 500*u**2 + 226*u - 24) / (3 * u * (u - 4) * (u - 2) * (u - 1) ** 4)
    r2 = 16 * (u + 1) * (2 * u - 1) / ((u - 4) * (u - 2) * (u - 1) ** 3)
    x = psim(2 * u) - psim(u)
    return (ref * (c_x * x + c_0) - m.sin(mp.pi * u) / mp.pi * (r0 + r1 * h + r2 * hp)) / 4


def ray(f, length, angle, growth=0, start=None):
    """Integral of e^(-Lu) f(u) along a ray above the axis, in Gauss-Legendre panels."""
    e = m.expj(angle)
    rate = length * m.cos(angle) - growth * m.sin(angle)
    end = mpf(mp.dps + 2) * m.log(10) / rate
    points = [start or mpf(0)]
    step = mpf(1) / 2
    while points[-1] < end:
        points.append(points[-1] + step)
        step = step if points[-1] < 4 else mpf(2)
    return m.quad(lambda r: e * m.exp(-r * e * length) * f(r * e), points, **GL)


def taylor_start(f, length, angle, radius):
    """The piece next to u = 0, where terms cancel, by Taylor coefficients from a circle."""
    e = m.expj(angle)
    count = 64
    size = 128
    circle_radius = mpf(1) / 5
    with mp.workdps(mp.dps + 20):
        values = [f(circle_radius * m.expjpi(mpf(2 * j + 1) / size)) for j in range(size)]
        list_ = [
            m.fsum(values[j] * m.expjpi(-mpf(2 * j + 1) * n / size) for j in range(size)).real / size / circle_radius**n
            for n in range(count)
        ]
    return m.quad(lambda r: e * m.exp(-r * e * length) * m.polyval(list_[::-1], r * e), [0, radius], **GL)


def main():
    task = json.load(sys.stdin)
    mp.dps = task["digits"]
    alpha = {3: mpf(task["alpha3"]), 4: mpf(task["alpha4"])}
    length = {nf: 1 / (beta0(nf) * a) - mpf(5) / 3 for nf, a in alpha.items()}
    cf = mpf(4) / 3
    start = mpf(1) / 20

    def plain(f, nf, norm, angle=None, growth=0):
        return norm / beta0(nf) * ray(f, length[nf], angle or mp.pi / 6, growth).real

    def mass():
        a = beta0(4) * alpha[4]
        # g_n falls off like (2/5)^n beside values of order 1 on the circle: digits that G_0 loses
        with mp.workdps(mp.dps + 12):
            g = subtraction(90)
        def g0(u):
            total, power = mpf(0), mpf(1)
            for n, c in enumerate(g):
                total += c * power
                power = power * u / (n + 1)
            return total
        def whole(u):
            return m.exp(5 * u / 3) * mass_main(u) + g0(u) / u / 4
        inverse = 1 / a
        angle = mp.pi / 6
        return cf / mp.pi / beta0(4) * (ray(whole, inverse, angle, 0, start) + taylor_start(whole, inverse, angle, start)).real

    def pole_width():
        angle = mp.pi / 12
        return cf / mp.pi / beta0(4) * (ray(width, length[4], angle, mp.pi, start) + taylor_start(width, length[4], angle, start)).real

    runs = {
        "adler": lambda: plain(adler, 3, 1 / mp.pi),
        "r-ratio": lambda: plain(circle, 3, 1 / mp.pi, mp.pi / 14, mp.pi),
        "tau-width": lambda: plain(tau, 3, 1 / mp.pi, mp.pi / 14, mp.pi),
        "bjorken": lambda: plain(sum_rule, 3, 1 / mp.pi),
        "static-potential": lambda: plain(potential, 3, mpf(1)),
        "pole-mass": mass,
        "b-to-u-pole": pole_width,
    }
    out = {"version": m.__version__, "values": {}, "seconds": {}}
    for name in task["names"]:
        begin = time.process_time()
        value = runs[name]()
        out["seconds"][name] = time.process_time() - begin
        out["values"][name] = mp.nstr(value, mp.dps)
    json.dump(out, sys.stdout)


main()
