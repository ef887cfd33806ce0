#include "isohydric/report/caution.hpp"

namespace isohydric::report {

std::string_view caution() {
    return "Not a diagnostic device. Findings and reasons for licensed clinicians, who decide by "
           "the patient and by local "
           "policy.";
}

}  // namespace isohydric::report
