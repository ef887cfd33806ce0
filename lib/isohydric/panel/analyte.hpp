// The analytes that a panel may hold. Their names are fixed; units, limits, aliases and codes are data (rules/analytes.json).
#pragma once

#include <array>
#include <cstddef>
#include <cstdint>
#include <optional>
#include <string_view>

namespace isohydric::panel {

enum class Analyte : std::uint8_t {
    ph,
    pco2,
    po2,
    hco3,
    tco2,
    be,
    sbe,
    na,
    k,
    cl,
    ica,
    ca,
    mg,
    albumin,
    phosphate,
    protein,
    lactate,
    bhb,
    glucose,
    urea,
    creatinine,
    osmolality,
    ethanol,
    hb,
    so2,
    cohb,
    methb,
    ag,
    agk,
    temperature,
    fio2,
    pressure,
    urine_na,
    urine_k,
    urine_cl,
    urine_urea,
    urine_glucose,
    urine_osmolality,
    urine_ph,
};
inline constexpr std::size_t k_analyte_count = 39;
inline constexpr std::array<std::string_view, k_analyte_count> k_analyte_ids{"pH",
                                                                             "pCO2",
                                                                             "pO2",
                                                                             "HCO3",
                                                                             "TCO2",
                                                                             "BE",
                                                                             "SBE",
                                                                             "Na",
                                                                             "K",
                                                                             "Cl",
                                                                             "iCa",
                                                                             "Ca",
                                                                             "Mg",
                                                                             "albumin",
                                                                             "phosphate",
                                                                             "protein",
                                                                             "lactate",
                                                                             "BHB",
                                                                             "glucose",
                                                                             "urea",
                                                                             "creatinine",
                                                                             "osmolality",
                                                                             "ethanol",
                                                                             "Hb",
                                                                             "sO2",
                                                                             "COHb",
                                                                             "MetHb",
                                                                             "AG",
                                                                             "AGK",
                                                                             "temperature",
                                                                             "FiO2",
                                                                             "pressure",
                                                                             "urineNa",
                                                                             "urineK",
                                                                             "urineCl",
                                                                             "urineUrea",
                                                                             "urineGlucose",
                                                                             "urineOsmolality",
                                                                             "urinepH"};

[[nodiscard]] constexpr std::size_t index_of(Analyte analyte) {
    return static_cast<std::size_t>(analyte);
}

[[nodiscard]] constexpr std::string_view id_of(Analyte analyte) {
    return k_analyte_ids[index_of(analyte)];
}

}  // namespace isohydric::panel
