"""The formulas of isohydric::chem written a second time, from the papers, for mpmath.

Each takes c, which makes a constant of its printed text, and the model's inputs, and returns the terms
whose sum is the value.
"""
from mpmath import mp

mp.dps = 50


def power10(x):
    return mp.mpf(10) ** x


def carbonic_bicarbonate(s, pk, ph, pco2):
    return s * pco2 * power10(ph - pk)


def base_excess(c, weight, reference, buffer, ph, hco3):
    return [weight * hco3, -weight * reference, weight * buffer * ph, -weight * buffer * c("7.4")]


def carbonate_ph(c, pco2, hco3):
    """Root of h + h^2 10^-8.7 = hco3 10^6.125 / (S pCO2)."""
    right = hco3 * power10(c("6.125")) / (c("0.230") * pco2)
    a = power10(-c("8.7"))
    return [mp.log10((mp.sqrt(1 + 4 * a * right) - 1) / (2 * a))]


def kelman_pk(c, ph, t):
    return [c("6.086"), c("0.042") * (c("7.4") - ph),
            (38 - t) * c("0.00472"), (38 - t) * c("0.00139") * (c("7.4") - ph)]


def austin(c, t):
    return [c("0.0307"), c("0.00057") * (37 - t), c("0.00002") * (37 - t) ** 2]


def kelman_ph(c, pco2, hco3, t):
    """pH with pK' = at_zero - fall pH put into Henderson and Hasselbalch's equation."""
    fall = c("0.042") + (38 - t) * c("0.00139")
    at_zero = c("6.086") + fall * c("7.4") + (38 - t) * c("0.00472")
    return [at_zero / (1 + fall), mp.log10(hco3 / (sum(austin(c, t)) * pco2)) / (1 + fall)]


def iapws(c, a, b, t, rho):
    a0, a1, a2 = map(c, a)
    b0, b1, b2 = map(c, b)
    two_thirds = mp.mpf(2.0 / 3.0) if c is as_double else mp.mpf(2) / 3
    q = rho * mp.exp(a0 + a1 / t + a2 / t ** 2 * rho ** two_thirds)
    return [-12 * mp.log10(1 + q), 12 * q / (1 + q) * rho * (b0 + b1 / t + b2 * rho),
            c("6.141500e-1"), c("4.825133e4") / t, c("-6.770793e4") / t ** 2, c("1.010210e7") / t ** 3,
            2 * mp.log10(c("18.015268e-3"))]


R11_07 = ("-0.864671", "8659.19", "-22786.2"), ("0.642044", "-56.8534", "-0.375754")
R11_24 = ("-0.702132", "8681.05", "-24145.1"), ("0.813876", "-51.4471", "-0.469920")


def kell(c, t):
    numerator = (c("999.83952") + c("16.945176") * t - c("7.9870401e-3") * t ** 2
                 - c("46.170461e-6") * t ** 3 + c("105.56302e-9") * t ** 4 - c("280.54253e-12") * t ** 5)
    return numerator / (1 + c("16.879850e-3") * t) / 1000


def marshall_franck(c, t, rho):
    log_rho = mp.log10(rho)
    return [c("4.098"), c("3245.2") / t, -c("2.2362e5") / t ** 2, c("3.984e7") / t ** 3,
            -c("13.957") * log_rho, c("1262.3") / t * log_rho, -c("8.5641e5") / t ** 2 * log_rho]


def siggaard_andersen_1960s(c, hb):
    return 1 - c("0.0143") * hb, c("24"), c("9.5") + c("1.63") * hb


def siggaard_andersen_1977(c, hb):
    return 1 - c("0.023") * hb, c("24.4"), c("7.7") + c("2.3") * hb


def siggaard_andersen_2006(c, hb, albumin, globulin, phosphate):
    return (1 - hb / 43, c("24.5"),
            c("2.3") * hb + c("8.0") * albumin + c("0.075") * globulin + c("0.309") * phosphate)


def clsi_blood(c, hb):
    return 1 - c("0.014") * hb, c("24.8"), c("7.7") + c("1.43") * hb


def lang_zander(c, ph, pco2, hb, so2):
    form = 1 - c("0.0143") * hb, c("24.26"), c("9.5") + c("1.63") * hb
    hco3 = carbonic_bicarbonate(c("0.0304"), c("6.1"), ph, pco2)
    return base_excess(c, *form, ph, hco3) + [-c("0.2") * hb * (1 - so2)]


def kellum_plasma(c, albumin, phosphate):
    return 1, c("24.4"), c("8.3") * c("0.15") * albumin + c("0.29") * c("0.32") * phosphate


def christiansen_standard(c, be, hb, so2):
    z = be - c("0.3062") * hb * (1 - so2)
    curvature = c("4.04e-3") + c("4.25e-4") * hb
    return [c("24.47"), c("0.919") * z, z * z * curvature, -8 * z * curvature]


def unattributed_standard(c, be, hb, so2):
    a = be - c("0.2") * hb * (1 - so2)
    return [c("24.5"), c("0.9") * a, (a - c("2.9")) ** 2 * (c("2.65") + c("0.31") * hb) / 1000]


def standard_bicarbonate(c, s, pk, hb, be):
    """b + k ln b = right, which Lambert's W solves."""
    weight, reference, buffer = siggaard_andersen_1977(c, hb)
    k = buffer / mp.log(10)
    right = be / weight + reference - buffer * (pk - mp.log10(s * 40) - c("7.4"))
    return [k * mp.lambertw(mp.exp(right / k) / k).real]


def clsi_po2_slope(c, po2):
    powered = po2 ** c("3.88")
    return (c("5.49e-11") * powered + c("0.071")) / (c("9.72e-9") * powered + c("2.30"))


def po2_at_37(c, po2, t):
    def miss(log_po2):
        return log_po2 + clsi_po2_slope(c, power10(log_po2)) * (t - 37) - mp.log10(po2)
    return [power10(mp.findroot(miss, (mp.mpf(-2), mp.mpf(5)), solver="anderson", tol=1e-60))]


def conventional(per_sodium, glucose_divisor, urea_divisor, constant):
    return lambda c, na, glucose, bun: [c(per_sodium) * na, glucose / c(glucose_divisor),
                                        bun / c(urea_divisor), c(constant)]


def ph_at(a, b):
    return lambda c, ph, t: [ph, -c(a) * (t - 37), -c(b) * (ph - c("7.4")) * (t - 37)]


def gas_at(coefficient):
    return lambda c, p, t: [p * power10(c(coefficient) * (t - 37))]


def as_printed(text):
    return mp.mpf(text)


def as_double(text):
    return mp.mpf(float(text))


FORMULAS = {
    "carbonic_acid::bicarbonate": lambda c, s, pk, ph, pco2: [carbonic_bicarbonate(s, pk, ph, pco2)],
    "carbonic_acid::ph": lambda c, s, pk, pco2, hco3: [pk, mp.log10(hco3 / (s * pco2))],
    "carbonic_acid::pco2": lambda c, s, pk, ph, hco3: [hco3 / (s * power10(ph - pk))],
    "carbonic_acid::hydrogen_ion": lambda c, s, pk, pco2, hco3: [power10(9 - pk) * s * pco2 / hco3],
    "total_co2::total_co2": lambda c, s, pk, pco2, hco3: [hco3, s * pco2],
    "total_co2::bicarbonate": lambda c, s, pk, pco2, tco2: [tco2, -s * pco2],
    "hydrogen_ion::hydrogen_ion": lambda c, ph: [power10(9 - ph)],
    "hydrogen_ion::ph": lambda c, h: [mp.mpf(9), -mp.log10(h)],
    "kassirer_bleich_1965::hydrogen_ion": lambda c, pco2, hco3: [24 * pco2 / hco3],
    "severinghaus_1976::bicarbonate":
        lambda c, ph, pco2: [c("0.61") * pco2 * power10(c("1.044") * (ph - c("7.4")))],
    "severinghaus_1976::ph":
        lambda c, pco2, hco3: [c("7.4"), mp.log10(hco3 / (c("0.61") * pco2)) / c("1.044")],
    "christiansen_1981::bicarbonate":
        lambda c, ph, pco2: [c("0.23") * pco2 * power10((ph - c("6.161")) / c("0.9524"))],
    "christiansen_1981::ph":
        lambda c, pco2, hco3: [c("6.161"), c("0.9524") * mp.log10(hco3 / (c("0.23") * pco2))],
    "siggaard_andersen_1988::pk":
        lambda c, ph: [c("6.125"), -mp.log10(1 + power10(ph - c("8.7")))],
    "siggaard_andersen_1988::bicarbonate":
        lambda c, ph, pco2: [c("0.230") * pco2 * power10(ph - c("6.125")) * (1 + power10(ph - c("8.7")))],
    "siggaard_andersen_1988::ph": carbonate_ph,
    "siggaard_andersen_1988::co2_solubility": lambda c, t: [c("0.230") * power10(c("-0.0092") * (t - 37))],
    "siggaard_andersen_1988::pk_at_temperature": lambda c, t: [c("6.1"), c("-0.0026") * (t - 37)],
    "austin_1963::co2_solubility": austin,
    "kelman_1967::pk": kelman_pk,
    "kelman_1967::bicarbonate":
        lambda c, ph, pco2, t: [carbonic_bicarbonate(sum(austin(c, t)), sum(kelman_pk(c, ph, t)), ph, pco2)],
    "kelman_1967::ph": kelman_ph,
    "iapws_r11_07::pkw": lambda c, t, rho: iapws(c, *R11_07, t, rho),
    "iapws_r11_24::pkw": lambda c, t, rho: iapws(c, *R11_24, t, rho),
    "iapws_r11_07::pkw_at_one_atmosphere": lambda c, t: iapws(c, *R11_07, t + c("273.15"), kell(c, t)),
    "marshall_franck_1981::pkw": marshall_franck,
    "harned_owen::pkw": lambda c, t: [c("4470.99") / t, -c("6.0875"), c("0.01706") * t],
    "kell_1975::density": lambda c, t: [kell(c, t)],
    "neutral_ph::at_temperature":
        lambda c, t: [term / 2 for term in iapws(c, *R11_24, t + c("273.15"), kell(c, t))],
    "siggaard_andersen_1960s::blood":
        lambda c, ph, hco3, hb: base_excess(c, *siggaard_andersen_1960s(c, hb), ph, hco3),
    "siggaard_andersen_1977::blood":
        lambda c, ph, hco3, hb: base_excess(c, *siggaard_andersen_1977(c, hb), ph, hco3),
    "siggaard_andersen_1977::extracellular_fluid":
        lambda c, ph, hco3, hb: base_excess(c, *siggaard_andersen_1977(c, hb / 3), ph, hco3),
    "siggaard_andersen_2006::blood":
        lambda c, ph, hco3, *buffers: base_excess(c, *siggaard_andersen_2006(c, *buffers), ph, hco3),
    "siggaard_andersen_ecf::extracellular_fluid":
        lambda c, ph, hco3: base_excess(c, c("0.93"), c("24.4"), c("14.8"), ph, hco3),
    "clsi::blood": lambda c, ph, hco3, hb: base_excess(c, *clsi_blood(c, hb), ph, hco3),
    "clsi::extracellular_fluid": lambda c, ph, hco3: base_excess(c, 1, c("24.8"), c("16.2"), ph, hco3),
    "kellum_2005::extracellular_fluid":
        lambda c, ph, hco3: base_excess(c, c("0.9287"), c("24.4"), c("14.83"), ph, hco3),
    "kellum_2005::plasma":
        lambda c, ph, hco3, *buffers: base_excess(c, *kellum_plasma(c, *buffers), ph, hco3),
    "wooten_2003::plasma":
        lambda c, ph, hco3, albumin, phosphate:
            base_excess(c, 1, c("24.4"), 8 * albumin + c("0.30") * phosphate, ph, hco3),
    "siggaard_andersen_1960s::blood_of_gas":
        lambda c, s, pk, ph, pco2, hb:
            base_excess(c, *siggaard_andersen_1960s(c, hb), ph, carbonic_bicarbonate(s, pk, ph, pco2)),
    "siggaard_andersen_1977::blood_of_gas":
        lambda c, s, pk, ph, pco2, hb:
            base_excess(c, *siggaard_andersen_1977(c, hb), ph, carbonic_bicarbonate(s, pk, ph, pco2)),
    "siggaard_andersen_ecf::extracellular_fluid_of_gas":
        lambda c, s, pk, ph, pco2:
            base_excess(c, c("0.93"), c("24.4"), c("14.8"), ph, carbonic_bicarbonate(s, pk, ph, pco2)),
    "clsi::blood_of_gas":
        lambda c, s, pk, ph, pco2, hb:
            base_excess(c, *clsi_blood(c, hb), ph, carbonic_bicarbonate(s, pk, ph, pco2)),
    "clsi::extracellular_fluid_of_gas":
        lambda c, s, pk, ph, pco2:
            base_excess(c, 1, c("24.8"), c("16.2"), ph, carbonic_bicarbonate(s, pk, ph, pco2)),
    "lang_zander_2002::base_excess": lang_zander,
    "christiansen_1981::standard_bicarbonate": christiansen_standard,
    "unattributed_standard_bicarbonate::standard_bicarbonate": unattributed_standard,
    "standard_bicarbonate::by_definition": standard_bicarbonate,
    "smithline_gardner_1976::osmolality": lambda c, na, k, glucose, urea: [2 * na, glucose, urea],
    "smithline_gardner_1976::conventional": conventional("2", "18", "2.8", "0"),
    "dorwart_chalmers_1975::osmolality": conventional("1.86", "18", "2.8", "9"),
    "laboratory_handbook::osmolality": conventional("1.91", "15", "2.25", "0"),
    "khajuria_krahn_2005::osmolality":
        lambda c, na, k, glucose, urea: [c("1.86") * (na + k), c("1.15") * glucose, urea, mp.mpf(14)],
    "rasouli_kalantari_2005::osmolality":
        lambda c, na, k, glucose, urea: [c("1.897") * na, glucose, urea, c("13.5")],
    "rasouli_kalantari_2005::osmolality_with_potassium":
        lambda c, na, k, glucose, urea: [c("1.90") * (na + k), glucose, urea, mp.mpf(5)],
    "zander::osmolality": lambda c, *solutes: [c("0.985") * (sum(solutes) + c("6.5"))],
    "ethanol::contribution": lambda c, factor, ethanol: [factor * ethanol],
    "ethanol::contribution_by_divisor": lambda c, divisor, ethanol: [ethanol / divisor],
    "temperature::ph_rosenthal": ph_at("0.0147", "0"),
    "temperature::ph_clsi": ph_at("0.0147", "0.0065"),
    "temperature::ph_clsi_0146": ph_at("0.0146", "0.0065"),
    "temperature::ph_at_37_clsi":
        lambda c, ph, t: [(ph + (c("0.0147") - c("0.0065") * c("7.4")) * (t - 37))
                          / (1 - c("0.0065") * (t - 37))],
    "temperature::pco2_nunn": gas_at("0.019"),
    "temperature::pco2_bradley": gas_at("0.0185"),
    "temperature::pco2_steep": gas_at("0.021"),
    "temperature::pco2_at_37_nunn": gas_at("-0.019"),
    "severinghaus_1979::ln_po2_per_degC":
        lambda c, p: [c("0.058") / (c("0.243") * (p / 100) ** c("3.88") + 1), c("0.013")],
    "po2_temperature_clsi::log10_po2_per_degC": lambda c, p: [clsi_po2_slope(c, p)],
    "po2_temperature_clsi::po2": lambda c, p, t: [p * power10(clsi_po2_slope(c, p) * (t - 37))],
    "po2_temperature_clsi::po2_at_37": po2_at_37,
}
