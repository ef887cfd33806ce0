// The explanations over a grid of gases, gaps and onsets: none is left unexplained, none is explained by opposite
// respiratory disorders.
#include "isohydric/panel/block.hpp"

#include <doctest/doctest.h>

#include <algorithm>
#include <cmath>
#include <optional>

#include "harness/shipped_rules.hpp"

namespace {

using namespace isohydric;

panel::Entered value_of(double value) {
    panel::Entered entered;
    entered.value = value;
    return entered;
}

class Grid {
  public:
    Grid() : program_(shared_program()), block_(1024), scratch_(program_, 1024) {
        const rule::RuleSet& rules = program_.rules();
        acidosis_ = *rules.find_disorder("respiratory-acidosis");
        alkalosis_ = *rules.find_disorder("respiratory-alkalosis");
    }

    void add(double pco2_mmHg,
             double hco3_mmol_L,
             std::optional<double> gap_mmol_L,
             panel::StatedOnset onset) {
        panel::Panel panel;
        panel[panel::Analyte::pco2] = value_of(pco2_mmHg);
        panel[panel::Analyte::hco3] = value_of(hco3_mmol_L);
        if (gap_mmol_L) {
            panel[panel::Analyte::ag] = value_of(*gap_mmol_L);
        }
        panel.context.specimen = panel::Specimen::arterial;
        panel.context.onset = onset;
        block_.push(panel);
        if (block_.size() == block_.capacity()) {
            judge();
        }
    }

    void judge() {
        engine::evaluate(program_, block_, scratch_);
        for (std::size_t row = 0; row < block_.size(); ++row) {
            bool fits = false;
            bool acidosis = false;
            bool alkalosis = false;
            for (std::uint32_t i = 0; i < program_.rules().explanations.size(); ++i) {
                if (scratch_.truth(*program_.explanation(i), row) == engine::Truth::yes) {
                    const std::vector<std::uint32_t>& disorders =
                        program_.rules().explanations[i].disorders;
                    fits = true;
                    acidosis =
                        acidosis || std::count(disorders.begin(), disorders.end(), acidosis_) > 0;
                    alkalosis =
                        alkalosis || std::count(disorders.begin(), disorders.end(), alkalosis_) > 0;
                }
            }
            ++points;
            holes += fits ? 0U : 1U;
            opposed += acidosis && alkalosis ? 1U : 0U;
        }
        block_.clear();
    }

    std::size_t points = 0, holes = 0, opposed = 0;

  private:
    static engine::Program shared_program() {
        const auto rules = harness::shipped_rules();
        engine::Selection selection;
        selection.everything = false;
        selection.keep_nodes = false;
        for (std::uint32_t i = 0; i < rules->explanations.size(); ++i) {
            selection.explanations.push_back(i);
        }
        return engine::Program(rules, selection);
    }

    engine::Program program_;
    panel::PanelBlock block_;
    engine::Scratch scratch_;
    std::uint32_t acidosis_ = 0, alkalosis_ = 0;
};

}  // namespace

TEST_CASE(
    "explanations: no point of the grid is a hole, and opposite respiratory disorders never meet") {
    // The steps of the grid are those of the outside trial of the same rules; pH by S 0.0306 and pK' 6.1.
    Grid grid;
    for (int p2 = 16; p2 <= 260; ++p2) {
        for (int h2 = 6; h2 <= 110; ++h2) {
            const double p = p2 / 2.0;
            const double h = h2 / 2.0;
            const double ph = 6.1 + std::log10(h / (0.0306 * p));
            if (ph < 6.8 || ph > 7.8) {
                continue;
            }
            for (const auto onset : {panel::StatedOnset::unknown,
                                     panel::StatedOnset::acute,
                                     panel::StatedOnset::chronic}) {
                grid.add(p, h, std::nullopt, onset);
                for (int gap = 4; gap < 45; gap += 2) {
                    grid.add(p, h, gap, onset);
                }
            }
        }
    }
    grid.judge();
    MESSAGE(grid.points << " points, " << grid.holes << " without an explanation, " << grid.opposed
                        << " with opposite ones");
    CHECK(grid.points > 1'000'000);
    CHECK(grid.holes == 0);
    CHECK(grid.opposed == 0);
}
