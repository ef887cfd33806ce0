# Fails unless g++ turns the loop of every array form, and a formula's own loop, into vectors, at -O3 as it
# is and at -O2 with the ordinary cost model.

file(MAKE_DIRECTORY ${SCRATCH})
file(WRITE ${SCRATCH}/formula.cpp [[
#include "isohydric/num/rounding.hpp"
namespace num = isohydric::num;
void bicarbonate(const double* ph, const double* pco2, double* __restrict out, int size) {
    for (int i = 0; i < size; ++i) {
        out[i] = 0.0307 * pco2[i] * num::pow10(ph[i] - 6.095);
    }
}
void rounded(const double* x, double* __restrict out, int size) {
    for (int i = 0; i < size; ++i) {
        out[i] = num::round_to_8_decimals(x[i]);
    }
}
void compared(const double* x, const double* y, int* __restrict out, int size) {
    for (int i = 0; i < size; ++i) {
        out[i] = num::compare_at_8_decimals(x[i], y[i]);
    }
}
]])

function(expect_loops count source)
    foreach(level "-O3" "-O2;-ftree-vectorize;-fvect-cost-model=dynamic")
        execute_process(COMMAND ${CXX} -std=c++20 ${level} -ffp-contract=off -fno-math-errno -I${SOURCE_DIR}/lib
                                -fopt-info-vec-optimized -c ${source} -o ${SCRATCH}/object.o
                        ERROR_VARIABLE report COMMAND_ERROR_IS_FATAL ANY)
        string(REGEX MATCHALL "loop vectorized" loops "${report}")
        list(LENGTH loops found)
        if(NOT found EQUAL ${count})
            message(SEND_ERROR "${source} at ${level}: ${found} of ${count} loops vectorised\n${report}")
        endif()
    endforeach()
endfunction()

expect_loops(6 ${SOURCE_DIR}/lib/isohydric/num/exp_log.cpp)
expect_loops(3 ${SCRATCH}/formula.cpp)
