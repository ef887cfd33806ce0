"""exp, log, log10, pow10 and pow of doubles at 50 digits, as raw mpmath numbers."""
from mpmath.libmp import dps_to_prec, from_float, mpf_div, mpf_exp, mpf_ln10, mpf_log, mpf_mul

PRECISION = dps_to_prec(50)
LN10 = mpf_ln10(PRECISION + 20)


def exp_of(t):
    return mpf_exp(t, PRECISION)


TRUE = {
    "exp": lambda x: exp_of(from_float(x)),
    "log": lambda x: mpf_log(from_float(x), PRECISION),
    "log10": lambda x: mpf_div(mpf_log(from_float(x), PRECISION + 20), LN10, PRECISION),
    "pow10": lambda x: exp_of(mpf_mul(from_float(x), LN10)),
    "pow": lambda x, y: exp_of(mpf_mul(from_float(y), mpf_log(from_float(x), PRECISION + 20))),
}
