#include "isohydric/report/caution.hpp"

#include "isohydric/report/detail/text_layout.hpp"

namespace isohydric::report {

std::string_view caution() {
    return "Not a diagnostic device. Findings and reasons for licensed clinicians, who decide by "
           "the patient and by local "
           "policy.";
}

std::string with_caution(std::string_view text, std::size_t width) {
    TextLayout layout(width);
    layout.item("", caution());
    const std::string lines = layout.take();
    std::string framed = lines + "\n";
    framed += text.substr(0, text.find_last_not_of('\n') + 1);
    return framed + "\n\n" + lines;
}

}  // namespace isohydric::report
