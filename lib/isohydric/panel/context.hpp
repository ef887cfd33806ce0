// What is known about a specimen besides its values. Items not given are empty or assumed, and an assumption is remembered.
#pragma once

#include "isohydric/diag/result.hpp"

#include <array>
#include <cstdint>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::panel {

enum class Specimen : std::uint8_t {
    arterial,
    venous,
    central_venous,
    mixed_venous,
    capillary,
    cord_arterial,
    cord_venous,
    not_stated
};
enum class Population : std::uint8_t {
    adult,
    child,
    neonate,
    pregnancy_1,
    pregnancy_2,
    pregnancy_3
};
enum class StatedOnset : std::uint8_t { unknown, acute, chronic };

inline constexpr std::array<std::string_view, 8> k_specimen_names{"arterial",
                                                                  "venous",
                                                                  "central-venous",
                                                                  "mixed-venous",
                                                                  "capillary",
                                                                  "cord-arterial",
                                                                  "cord-venous",
                                                                  "not-stated"};
inline constexpr std::array<std::string_view, 6> k_population_names{
    "adult", "child", "neonate", "pregnancy-1", "pregnancy-2", "pregnancy-3"};
inline constexpr std::array<std::string_view, 3> k_onset_names{"unknown", "acute", "chronic"};

/// What expressions may ask of the context, `context.<item>`. Codes are never missing; `near` is a truth that the
/// interpreter sets to evaluate bands widened by the margin of the measurement.
enum class ContextItem : std::uint8_t {
    specimen,
    population,
    onset,
    age,
    altitude,
    baseline_pco2,
    baseline_hco3,
    near
};
inline constexpr std::array<std::string_view, 8> k_context_item_names{
    "specimen", "population", "onset", "age", "altitude", "baselinePCO2", "baselineHCO3", "near"};
/// Canonical units of the numeric items, UCUM; empty for codes and truths.
inline constexpr std::array<std::string_view, 8> k_context_item_units{
    "", "", "", "a", "m", "mm[Hg]", "mmol/L", ""};

/// The context of one panel.
struct Context {
    Specimen specimen = Specimen::not_stated;
    Population population = Population::adult;
    StatedOnset onset = StatedOnset::unknown;
    std::optional<double> age_a;
    std::optional<double> altitude_m;
    std::optional<double> baseline_pco2_mmHg;
    std::optional<double> baseline_hco3_mmol_L;
    std::vector<std::string> assumed;  ///< in words: "specimen: arterial"
};

/// A specimen by its name; letter case and separators do not matter. The error says what is known.
[[nodiscard]] diag::Result<Specimen> read_specimen(std::string_view text);
[[nodiscard]] diag::Result<Population> read_population(std::string_view text);
[[nodiscard]] diag::Result<StatedOnset> read_onset(std::string_view text);

/// An age with its unit (`15min`, `6h`, `3d`, `5wk`, `2mo`, `4y` or `4a`) in years of 365.25 days [@ucum, section 4.3].
[[nodiscard]] diag::Result<double> read_age_a(std::string_view text);

/// An altitude in metres, bare or as `3510m`, `3.5km`; between the Dead Sea and the highest summit.
[[nodiscard]] diag::Result<double> read_altitude_m(std::string_view text);

/// Neonate below 28 days, child below 18 years, else adult: common practice.
[[nodiscard]] Population population_of_age(double age_a);

/// Whether somebody of that age can be of that population. Pregnancy starts at 10 years: common practice.
[[nodiscard]] bool fits_age(Population population, double age_a);

}  // namespace isohydric::panel
