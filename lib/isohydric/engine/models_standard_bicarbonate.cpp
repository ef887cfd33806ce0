// Standard bicarbonate: by its definition from a base-excess form, and by the published polynomials.
#include "isohydric/chem/base_excess_clsi.hpp"
#include "isohydric/chem/base_excess_lang_zander_2002.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_1960s.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_1977.hpp"
#include "isohydric/chem/standard_bicarbonate.hpp"
#include "isohydric/chem/standard_bicarbonate_christiansen_1981.hpp"
#include "isohydric/chem/standard_bicarbonate_unattributed.hpp"
#include "isohydric/engine/model_registry.hpp"

namespace isohydric::engine {

namespace {

[[nodiscard]] rule::ModelPort standard_bicarbonate() {
    return result("standardBicarbonate", "mmol/L");
}

[[nodiscard]] rule::ModelPort base_excess_port() {
    return port("BE", "mmol/L", chem::usual::k_base_excess_mmol_L);
}

/// The definition with the form for blood that `Form` gives for a haemoglobin.
template <typename Form>
void add_definition(Models& models, std::string id, Form, rule::ModelPort haemoglobin) {
    add_model(
        models,
        std::move(id),
        []<num::Number T>(T base_excess_mmol_L, T haemoglobin_value, T solubility, T pk) {
            return chem::standard_bicarbonate_mmol_L(Form{}(haemoglobin_value),
                                                     chem::CarbonicAcid<T>{solubility, pk},
                                                     base_excess_mmol_L);
        },
        standard_bicarbonate(),
        base_excess_port(),
        std::move(haemoglobin),
        solubility_port(),
        pk_port());
}

}  // namespace

void add_standard_bicarbonate_models(Models& models) {
    add_definition(
        models,
        "standardBicarbonate.siggaardAndersen1960s",
        [](auto hb_g_dL) { return chem::siggaard_andersen_1960s::blood(hb_g_dL); },
        hb_g_dL_port());
    add_definition(
        models,
        "standardBicarbonate.siggaardAndersen1977",
        [](auto hb_mmol_L) { return chem::siggaard_andersen_1977::blood(hb_mmol_L); },
        hb_mmol_L_port());
    add_definition(
        models,
        "standardBicarbonate.clsi",
        [](auto hb_g_dL) { return chem::clsi::blood(hb_g_dL); },
        hb_g_dL_port());
    add_definition(
        models,
        "standardBicarbonate.langZander2002",
        [](auto hb_g_dL) { return chem::lang_zander_2002::blood(hb_g_dL); },
        hb_g_dL_port());
    add_model(
        models,
        "standardBicarbonate.christiansen1981",
        [](auto base_excess_mmol_L, auto hb_mmol_L, auto so2) {
            return chem::christiansen_1981::standard_bicarbonate_mmol_L(
                base_excess_mmol_L, hb_mmol_L, so2);
        },
        standard_bicarbonate(),
        base_excess_port(),
        hb_mmol_L_port(),
        so2_port());
    add_model(
        models,
        "standardBicarbonate.unattributed",
        [](auto base_excess_mmol_L, auto hb_g_dL, auto so2) {
            return chem::unattributed_standard_bicarbonate::standard_bicarbonate_mmol_L(
                base_excess_mmol_L, hb_g_dL, so2);
        },
        standard_bicarbonate(),
        base_excess_port(),
        hb_g_dL_port(),
        so2_port());
}

}  // namespace isohydric::engine
