// Base excess by every published form, each from pH, the bicarbonate of its own constants and what else it asks for.
#include "isohydric/chem/base_excess.hpp"
#include "isohydric/chem/base_excess_clsi.hpp"
#include "isohydric/chem/base_excess_kellum_2005.hpp"
#include "isohydric/chem/base_excess_lang_zander_2002.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_1960s.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_1977.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_2006.hpp"
#include "isohydric/chem/base_excess_siggaard_andersen_ecf.hpp"
#include "isohydric/chem/base_excess_wooten_2003.hpp"
#include "isohydric/engine/model_registry.hpp"

namespace isohydric::engine {

namespace {

using chem::base_excess_mmol_L;

[[nodiscard]] rule::ModelPort base_excess() {
    return result("BE", "mmol/L");
}

void add_blood(Models& models) {
    add_model(
        models,
        "baseExcess.siggaardAndersen1960s",
        [](auto ph, auto hco3_mmol_L, auto hb_g_dL) {
            return base_excess_mmol_L(
                chem::siggaard_andersen_1960s::blood(hb_g_dL), ph, hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port(),
        hb_g_dL_port());
    add_model(
        models,
        "baseExcess.siggaardAndersen1977",
        [](auto ph, auto hco3_mmol_L, auto hb_mmol_L) {
            return base_excess_mmol_L(
                chem::siggaard_andersen_1977::blood(hb_mmol_L), ph, hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port(),
        hb_mmol_L_port());
    add_model(
        models,
        "baseExcess.siggaardAndersen2006",
        []<num::Number T>(T ph, T hco3_mmol_L, T hb_mmol_L, T albumin, T globulin, T phosphate) {
            return base_excess_mmol_L(
                chem::siggaard_andersen_2006::blood<T>({hb_mmol_L, albumin, globulin, phosphate}),
                ph,
                hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port(),
        hb_mmol_L_port(),
        port("albumin", "mmol/L", chem::usual::k_albumin_mmol_L),
        port("globulin", "g/L", chem::usual::k_globulin_g_L),
        port("phosphate", "mmol/L", chem::usual::k_phosphate_mmol_L));
    add_model(
        models,
        "baseExcess.clsi",
        [](auto ph, auto hco3_mmol_L, auto hb_g_dL) {
            return base_excess_mmol_L(chem::clsi::blood(hb_g_dL), ph, hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port(),
        hb_g_dL_port());
    add_model(
        models,
        "baseExcess.langZander2002",
        []<num::Number T>(T ph, T pco2_mmHg, T hb_g_dL, T so2) {
            return chem::lang_zander_2002::base_excess_mmol_L<T>({ph, pco2_mmHg, hb_g_dL, so2});
        },
        base_excess(),
        ph_port(),
        port("pCO2", "mm[Hg]", chem::lang_zander_2002::k_pco2_mmHg),
        hb_g_dL_port(),
        so2_port());
}

void add_extracellular_fluid(Models& models) {
    add_model(
        models,
        "baseExcess.siggaardAndersen1977Ecf",
        [](auto ph, auto hco3_mmol_L, auto hb_mmol_L) {
            return base_excess_mmol_L(
                chem::siggaard_andersen_1977::extracellular_fluid(hb_mmol_L), ph, hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port(),
        hb_mmol_L_port());
    add_model(
        models,
        "baseExcess.siggaardAndersenEcf",
        []<num::Number T>(T ph, T hco3_mmol_L) {
            return base_excess_mmol_L(
                chem::siggaard_andersen_ecf::extracellular_fluid<T>(), ph, hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port());
    add_model(
        models,
        "baseExcess.clsiEcf",
        []<num::Number T>(T ph, T hco3_mmol_L) {
            return base_excess_mmol_L(chem::clsi::extracellular_fluid<T>(), ph, hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port());
    add_model(
        models,
        "baseExcess.kellum2005Ecf",
        []<num::Number T>(T ph, T hco3_mmol_L) {
            return base_excess_mmol_L(chem::kellum_2005::extracellular_fluid<T>(), ph, hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port());
}

void add_plasma(Models& models) {
    add_model(
        models,
        "baseExcess.kellum2005Plasma",
        [](auto ph, auto hco3_mmol_L, auto albumin_g_dL, auto phosphate_mg_dL) {
            return base_excess_mmol_L(
                chem::kellum_2005::plasma(albumin_g_dL, phosphate_mg_dL), ph, hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port(),
        port("albumin", "g/dL", chem::usual::k_albumin_g_dL),
        port("phosphate", "mg/dL", chem::usual::k_phosphate_mg_dL));
    add_model(
        models,
        "baseExcess.wooten2003",
        [](auto ph, auto hco3_mmol_L, auto albumin_mmol_L, auto phosphate_mmol_L) {
            return base_excess_mmol_L(
                chem::wooten_2003::plasma(albumin_mmol_L, phosphate_mmol_L), ph, hco3_mmol_L);
        },
        base_excess(),
        ph_port(),
        hco3_port(),
        port("albumin", "mmol/L", chem::usual::k_albumin_mmol_L),
        port("phosphate", "mmol/L", chem::usual::k_phosphate_mmol_L));
}

}  // namespace

void add_base_excess_models(Models& models) {
    add_blood(models);
    add_extracellular_fluid(models);
    add_plasma(models);
}

}  // namespace isohydric::engine
