#!/usr/bin/env python3
"""Reference roots of real polynomials, from mpmath (a general-purpose library for arbitrary precision).

    python3 make_roots.py > roots.json

Every case is a list of double-precision coefficients (ascending powers) and the roots of exactly
those coefficients, found with several hundred digits and rounded to double. The polynomials are
products of factors (1 + s*tau) and (1 + s/(Q*w) + s^2/w^2) multiplied with 50 digits and rounded.
"""
import json
import random
import sys

import mpmath

mpmath.mp.dps = 50
rng = random.Random(20)


def product(factors):
    total = [mpmath.mpf(1)]
    for factor in factors:
        grown = [mpmath.mpf(0)] * (len(total) + len(factor) - 1)
        for i, a in enumerate(total):
            for j, b in enumerate(factor):
                grown[i + j] += a * b
        total = grown
    return [float(c) for c in total]


def real(tau):
    return [mpmath.mpf(1), mpmath.mpf(tau)]


def pair(omega, quality):
    return [mpmath.mpf(1), 1 / (mpmath.mpf(omega) * quality), 1 / mpmath.mpf(omega) ** 2]


def exact_roots(coefficients):
    """Roots with the variable scaled to their geometric mean, else mpmath's start is decades away."""
    degree = len(coefficients) - 1
    with mpmath.workdps(400):
        c = [mpmath.mpf(x) for x in coefficients]
        unit = abs(c[0] / c[-1]) ** (mpmath.mpf(1) / degree)
        scaled = [x * unit ** k for k, x in enumerate(c)]
        roots = mpmath.polyroots(scaled[::-1], maxsteps=2000, extraprec=400)
        out = []
        for root in roots:
            z = mpmath.mpc(root) * unit
            if abs(z.imag) < mpmath.mpf(10) ** -150 * abs(z):
                z = mpmath.mpc(z.real, 0)
            out.append([float(z.real), float(z.imag)])
    return sorted(out, key=lambda z: (abs(complex(*z)), z[1]))


def spread(order, low, high, gap):
    """Time constants with neighbours at least `gap` apart (as a ratio)."""
    while True:
        taus = sorted((10 ** rng.uniform(low, high) for _ in range(order)), reverse=True)
        if all(a / b >= gap for a, b in zip(taus, taus[1:])):
            return taus


cases = []


def add(kind, factors):
    coefficients = product(factors)
    cases.append({"kind": kind, "coefficients": coefficients, "roots": exact_roots(coefficients)})


for order in (3, 4, 5, 6, 8, 10, 12, 16):
    for _ in range(3):
        add("real, apart", [real(t) for t in spread(order, -8, -1, 1.6 if order > 10 else 2.5)])
for order in (3, 4, 6):
    for gap in (1.1, 1.01, 1.0001, 1.0000001):
        taus = spread(order - 1, -6, -1, 3)
        add("real, two close", [real(t) for t in taus + [taus[0] * gap]])
for reals, pairs in ((1, 1), (2, 1), (0, 2), (3, 2), (1, 3), (6, 2), (4, 6), (2, 7)):
    for _ in range(2):
        add("complex", [real(t) for t in spread(reals, -7, -2, 2)]
            + [pair(10 ** rng.uniform(1.5, 6.5), 10 ** rng.uniform(-0.2, 1.5)) for _ in range(pairs)])
for quality in (0.5000001, 0.500000000001, 0.5001):
    add("complex, almost real", [real(1e-3), real(2e-5), pair(3e3, quality)])
for quality in (30, -0.7, -4):
    add("complex, to the right or near the axis", [real(1e-2), real(-3e-4), pair(2e4, quality)])
json.dump({"mpmath": mpmath.__version__, "cases": cases}, sys.stdout, indent=1)
