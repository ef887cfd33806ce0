// A checked rule set: every entry in force, names resolved, with the hash that identifies it on every result.
#pragma once

#include "isohydric/diag/report.hpp"
#include "isohydric/panel/catalogue.hpp"
#include "isohydric/rule/entries.hpp"

#include <cstdint>
#include <functional>
#include <map>
#include <memory>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace isohydric::rule {

/// One input or the result of a chemistry model, as the engine registers it.
struct ModelPort {
    std::string name;
    std::string unit;      ///< UCUM
    double low{}, high{};  ///< domain, inclusive
};

/// A chemistry model as rules may call it.
struct ModelSignature {
    std::string id;  ///< `carbonicAcid.bicarbonate`
    std::vector<ModelPort> inputs;
    ModelPort result;
};

/// One item of the bibliography, as much of CSL-JSON as reports print.
struct BibliographyItem {
    std::string id;
    std::string citation;  ///< "Albert MS, Dell RB, Winters RW. Ann Intern Med 1967;66:312-22"
    diag::Place place;
};

/// Gives the text of a file by its path: relative to the rule tree (`sets/default.json`), or beginning with `/`, `./` or
/// `../` for files outside it; none if there is no such file.
using FileReader = std::function<std::optional<std::string>(const std::string& path)>;

/// The kinds of entries, in the order in which a rule file's arrays are listed.
enum class EntryKind : std::uint8_t {
    quantity,
    condition,
    interval,
    finding,
    table,
    explanation,
    group,
    check,
    critical,
    disorder,
    convention,
};

/// The kind in words: `quantity`, `critical value`.
[[nodiscard]] std::string_view describe(EntryKind kind);

/// Where an entry stands: an index into the vector of its kind.
struct EntryRef {
    EntryKind kind{};
    std::uint32_t index{};

    friend bool operator==(const EntryRef&, const EntryRef&) = default;
};

/// A resolved rule set. Entries of a kind stand in the order of the files. Immutable after reading; share it.
class RuleSet {
  public:
    std::string id;
    std::string version;
    std::string title;
    std::string approved_role;  ///< empty: a draft
    std::string approved_date;
    std::string canonical;  ///< RFC 8785 form of what is in force (canonical.hpp)
    std::string sha256;     ///< of the canonical form, lower-case hex

    std::shared_ptr<const panel::Catalogue> catalogue;
    std::vector<ModelSignature> models;
    std::vector<Quantity> quantities;
    std::vector<Condition> conditions;
    std::vector<std::string> interval_names;
    std::vector<units::Unit> interval_units;
    std::vector<Interval> intervals;
    std::vector<Finding> findings;  ///< those of tables among them
    std::vector<Table> tables;
    std::vector<Check> checks;
    std::vector<Critical> criticals;
    std::vector<Explanation> explanations;
    std::vector<Group> groups;
    std::vector<Disorder> disorders;
    std::vector<Convention> conventions;  ///< all shipped alternatives, chosen or not
    std::vector<BibliographyItem> bibliography;
    std::vector<Case> cases;  ///< only when asked for
    std::map<std::string, EntryRef, std::less<>> by_id;

    /// The entry of that id, whatever its kind.
    [[nodiscard]] std::optional<EntryRef> find(std::string_view id_wanted) const;
    /// The index of the entry of that id, if it is of that kind.
    [[nodiscard]] std::optional<std::uint32_t> find(std::string_view id_wanted,
                                                    EntryKind kind) const;
    [[nodiscard]] std::optional<std::uint32_t> find_quantity(std::string_view id_wanted) const;
    [[nodiscard]] std::optional<std::uint32_t> find_condition(std::string_view id_wanted) const;
    [[nodiscard]] std::optional<std::uint32_t> find_finding(std::string_view id_wanted) const;
    [[nodiscard]] std::optional<std::uint32_t> find_interval_name(std::string_view name) const;
    [[nodiscard]] std::optional<std::uint32_t> find_disorder(std::string_view id_wanted) const;
    [[nodiscard]] std::optional<std::uint32_t> find_explanation(std::string_view id_wanted) const;
    /// The citation line of a bibliography key, or the key itself.
    [[nodiscard]] std::string_view citation(std::string_view ref) const;
};

struct ReadOptions {
    bool with_cases = false;
};

/// Reads the set at `set_path`, all that it extends and every file that it names, and checks everything. A set whose path
/// begins with `/`, `./` or `../` lies outside the rule tree; its own paths are relative to it first, then to the tree.
/// Errors go to the report, many a run; the result is empty if there is any.
[[nodiscard]] std::shared_ptr<const RuleSet> read_rule_set(const std::string& set_path,
                                                           const FileReader& files,
                                                           std::span<const ModelSignature> models,
                                                           diag::Report& report,
                                                           const ReadOptions& options = {});

}  // namespace isohydric::rule
