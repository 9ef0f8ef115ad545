#!/usr/bin/env python3
"""Reference numbers for the engine's geometry, computed with SciPy.

Run `python3 tests/properties/scipy/make_fixtures.py` from the top of the checkout (Debian:
python3-scipy). It writes fixtures.json beside itself. Nothing here shares a formula with the
engine beyond the definitions: fractions are plain double integrals of the intensity, distances
are roots of the exposure against the limit.

Lengths are in mm where the name says so, otherwise in m; widths are 1/e widths for a Gaussian and
full widths for a top-hat.
"""

import json
import math
import pathlib

import scipy
from scipy import integrate, optimize, special

APERTURES_MM = [1.0, 3.5, 7.0, 11.0]
GAUSSIAN_MM = [
    (0.5, 0.5), (2.0, 2.0), (7.0, 7.0), (40.0, 40.0), (700.0, 700.0),
    (0.3, 1.2), (1.0, 3.0), (2.0, 9.0), (3.0, 30.0), (6.9, 7.1), (20.0, 160.0), (5.0, 400.0),
]
TOP_HAT_MM = [
    (0.5, 0.5), (6.0, 6.0), (7.0, 7.0), (50.0, 50.0),
    (0.3, 1.2), (1.0, 3.0), (2.0, 9.0), (3.0, 30.0), (6.9, 7.1), (4.0, 200.0),
]


def gaussian_fraction(aperture_mm, dx_mm, dy_mm):
    """Quarter-plane integral in polar coordinates of the normalized Gaussian."""
    wx, wy = dx_mm / 2, dy_mm / 2

    def intensity(r, psi):
        x, y = r * math.cos(psi), r * math.sin(psi)
        return r * math.exp(-(x / wx) ** 2 - (y / wy) ** 2) / (math.pi * wx * wy)

    radius = aperture_mm / 2
    # The core is split off so that a narrow peak is not missed by the outer rule.
    edges = sorted({min(radius, k * min(wx, wy)) for k in (0.5, 1, 2, 4, 8, 16, 64)} | {0, radius})
    total = 0.0
    for low, high in zip(edges, edges[1:]):
        part, _ = integrate.dblquad(
            intensity, 0, math.pi / 2, low, high, epsabs=1e-16, epsrel=1e-13
        )
        total += 4 * part
    return total


def top_hat_fraction(aperture_mm, dx_mm, dy_mm):
    """Area of ellipse and circle in common, over the area of the ellipse, by strips."""
    a, b, c = dx_mm / 2, dy_mm / 2, aperture_mm / 2

    def height(x):
        ellipse = b * math.sqrt(max(0.0, 1 - (x / a) ** 2))
        circle = math.sqrt(max(0.0, c * c - x * x))
        return min(ellipse, circle)

    end = min(a, c)
    breaks = [0.0, end]
    if (b - c) * (a - c) < 0:
        breaks.insert(1, a * math.sqrt((c * c - b * b) / (a * a - b * b)))
    total = 0.0
    for low, high in zip(breaks, breaks[1:]):
        # x = mid - half cos(u) takes the square-root ends out of the integrand.
        mid, half = (low + high) / 2, (high - low) / 2
        part, _ = integrate.quad(
            lambda u: height(mid - half * math.cos(u)) * half * math.sin(u),
            0, math.pi, epsabs=1e-15, epsrel=1e-13, limit=200,
        )
        total += part
    return 4 * total / (math.pi * a * b)


def fractions():
    rows = []
    for shape, sizes, fraction in (
        ("gaussian", GAUSSIAN_MM, gaussian_fraction),
        ("top-hat", TOP_HAT_MM, top_hat_fraction),
    ):
        for aperture in APERTURES_MM:
            for size in sizes:
                rows.append({
                    "profile": shape, "apertureMm": aperture, "widthsMm": size,
                    "fraction": fraction(aperture, *size),
                })
    return rows


def width(d_m, phi, z_m, growth, r):
    if growth == "linear":
        return d_m + phi * (abs(r - z_m) - abs(z_m))
    return math.sqrt(d_m ** 2 + phi ** 2 * ((r - z_m) ** 2 - z_m ** 2))


def mean_irradiance(case, r):
    """Mean over the aperture at r, W/m2, with air."""
    power, air = case["powerW"], math.exp(-case["attenuationPerKm"] * r / 1000)
    wx, wy = (
        width(case["diametersMm"][i] / 1000, case["divergencesMrad"][i] / 1000,
              case["waistDistanceM"], case["growth"], r)
        for i in (0, 1)
    )
    area = math.pi * (case["apertureMm"] / 1000) ** 2 / 4
    if case["profile"] == "top-hat":
        return air * power * top_hat_fraction(case["apertureMm"], wx * 1000, wy * 1000) / area
    if wx == wy:
        return air * power * -math.expm1(-((case["apertureMm"] / 1000 / wx) ** 2)) / area
    # The mean over the elliptical angle, by adaptive quadrature.
    part, _ = integrate.quad(
        lambda psi: -math.expm1(
            -((case["apertureMm"] / 1000) ** 2)
            / ((wx * math.cos(psi)) ** 2 + (wy * math.sin(psi)) ** 2)
        ),
        0, math.pi / 2, epsabs=0, epsrel=1e-13, limit=400,
    )
    return air * power * 2 / math.pi * part / area


def distance(case):
    limit = case["limitWPerM2"]
    start = max(0.0, case["waistDistanceM"])
    if mean_irradiance(case, start) < limit:
        return 0.0
    high = start + 1.0
    while mean_irradiance(case, high) >= limit:
        high *= 2
    return optimize.brentq(
        lambda r: mean_irradiance(case, r) - limit, start, high, xtol=1e-12, rtol=1e-14
    )


def distances():
    """A visible beam looked at for 0.25 s: the limit is 18 t^0.75 / t over 7 mm."""
    limit = 18 * 0.25 ** 0.75 / 0.25
    base = {"limitWPerM2": limit, "apertureMm": 7.0, "waistDistanceM": 0.0,
            "attenuationPerKm": 0.0, "profile": "gaussian", "growth": "hyperbolic"}
    variants = [
        {"powerW": 5.0, "diametersMm": (2.0, 2.0), "divergencesMrad": (0.5, 0.5)},
        {"powerW": 5.0, "diametersMm": (2.0, 2.0), "divergencesMrad": (0.5, 0.5),
         "attenuationPerKm": 0.2},
        {"powerW": 200.0, "diametersMm": (8.0, 8.0), "divergencesMrad": (0.1, 0.1),
         "attenuationPerKm": 1.5},
        {"powerW": 0.004, "diametersMm": (3.0, 3.0), "divergencesMrad": (1.0, 1.0)},
        {"powerW": 0.0011, "diametersMm": (3.0, 3.0), "divergencesMrad": (1.0, 1.0)},
        {"powerW": 1.0, "diametersMm": (1.0, 4.0), "divergencesMrad": (2.0, 0.5)},
        {"powerW": 1.0, "diametersMm": (1.0, 4.0), "divergencesMrad": (2.0, 0.5),
         "growth": "linear"},
        {"powerW": 30.0, "diametersMm": (1.0, 6.0), "divergencesMrad": (8.0, 0.3),
         "attenuationPerKm": 0.4},
        {"powerW": 2.0, "diametersMm": (5.0, 5.0), "divergencesMrad": (1.0, 1.0),
         "profile": "top-hat"},
        {"powerW": 2.0, "diametersMm": (5.0, 2.0), "divergencesMrad": (1.0, 3.0),
         "profile": "top-hat"},
        {"powerW": 2.0, "diametersMm": (5.0, 2.0), "divergencesMrad": (1.0, 3.0),
         "profile": "top-hat", "growth": "linear", "attenuationPerKm": 2.0},
        {"powerW": 0.5, "diametersMm": (6.0, 6.0), "divergencesMrad": (1.0, 1.0),
         "waistDistanceM": 4.0},
        {"powerW": 0.5, "diametersMm": (6.0, 6.0), "divergencesMrad": (1.0, 1.0),
         "waistDistanceM": 4.0, "growth": "linear"},
        {"powerW": 0.5, "diametersMm": (6.0, 6.0), "divergencesMrad": (1.0, 1.0),
         "waistDistanceM": -2.0},
        {"powerW": 0.5, "diametersMm": (6.0, 8.0), "divergencesMrad": (1.0, 0.7),
         "waistDistanceM": 3.0, "attenuationPerKm": 1.0},
    ]
    rows = []
    for variant in variants:
        case = {**base, **variant}
        rows.append({**case, "distanceM": distance(case)})
    return rows


def far_fields():
    """Far from the exit the peak in air has a closed form: r = (2/mu) W(mu r0/2), r0 without air."""
    limit = 18 * 0.25 ** 0.75 / 0.25
    rows = []
    for power, phi_mrad, per_km in [(10, 0.2, 0.1), (50, 0.05, 0.5), (1000, 0.02, 2.0), (3, 1, 8)]:
        mu = per_km / 1000
        without = math.sqrt(4 * power / (math.pi * limit)) / (phi_mrad / 1000)
        rows.append({
            "powerW": power, "divergenceMrad": phi_mrad, "attenuationPerKm": per_km,
            "distanceM": float(2 / mu * special.lambertw(mu * without / 2).real),
        })
    return rows


def main():
    fixtures = {
        "madeWith": f"SciPy {scipy.__version__}",
        "fractions": fractions(),
        "distances": distances(),
        "farFields": far_fields(),
    }
    parts = []
    for key, value in fixtures.items():
        if isinstance(value, str):
            parts.append(f'  "{key}": {json.dumps(value)}')
        else:
            lines = ",\n".join("    " + json.dumps(row) for row in value)
            parts.append(f'  "{key}": [\n{lines}\n  ]')
    target = pathlib.Path(__file__).with_name("fixtures.json")
    target.write_text("{\n" + ",\n".join(parts) + "\n}\n")


if __name__ == "__main__":
    main()
