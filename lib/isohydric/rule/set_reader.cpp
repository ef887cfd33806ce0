// Reads a rule set from its files, step by step. A step that finds errors ends the reading after it has told of all of
// them, since the next one would only repeat them in other words.
#include "isohydric/diag/text.hpp"
#include "isohydric/rule/canonical.hpp"
#include "isohydric/rule/cases.hpp"
#include "isohydric/rule/detail/canonical_set.hpp"
#include "isohydric/rule/detail/consistency.hpp"
#include "isohydric/rule/detail/entry_reader.hpp"
#include "isohydric/rule/detail/set_file.hpp"
#include "isohydric/rule/rule_set.hpp"

#include <algorithm>
#include <utility>

namespace isohydric::rule {
namespace {

class SetReader {
  public:
    SetReader(const FileReader& files, diag::Report& report)
        : documents_(files, report), report_(report), errors_before_(report.error_count()) {}

    std::shared_ptr<const RuleSet> read(const std::string& path,
                                        std::span<const ModelSignature> models,
                                        const ReadOptions& options) {
        rules_->models.assign(models.begin(), models.end());
        read_files(path);
        if (clean()) {
            declare_names();
        }
        if (clean()) {
            read_entries();
        }
        if (clean()) {
            detail::check_cycles(*rules_, report_);
            detail::check_overlaps(*rules_, report_);
            detail::check_alternatives(*rules_, declared_, report_);
            if (options.with_cases) {
                read_all_cases();
            }
        }
        if (!clean()) {
            return nullptr;
        }
        rules_->canonical =
            detail::canonical_set(drafts_.entries, chosen_, analytes_->json, bibliography_);
        rules_->sha256 = sha256_hex(rules_->canonical);
        return rules_;
    }

  private:
    [[nodiscard]] bool clean() const { return report_.error_count() == errors_before_; }

    void read_files(const std::string& path) {
        chain_ = detail::read_set_chain(path, documents_, report_);
        if (!clean()) {
            return;
        }
        const detail::SetFile& set = chain_.back();
        rules_->id = set.id;
        rules_->version = set.version;
        rules_->title = set.title;
        rules_->approved_role = set.approved_role;
        rules_->approved_date = set.approved_date;
        drafts_ = detail::read_drafts(chain_, documents_, report_);
        read_analytes();
        read_sources();
        chosen_ = detail::choose_conventions(chain_, drafts_.entries, report_);
    }

    // A set that names its own catalogue replaces that of its parent.
    void read_analytes() {
        for (const detail::SetFile& set : chain_) {
            if (set.analytes) {
                analytes_ = documents_.read(*set.analytes, set.path);
            }
        }
        if (analytes_ != nullptr) {
            rules_->catalogue = panel::read_catalogue(analytes_->source, report_);
        }
    }

    // A set that names its own bibliography adds it to that of its parent.
    void read_sources() {
        std::vector<const detail::Document*> read;
        for (const detail::SetFile& set : chain_) {
            const detail::Document* file =
                set.sources ? documents_.read(*set.sources, set.path) : nullptr;
            if (file != nullptr && std::ranges::find(read, file) == read.end()) {
                read.push_back(file);
                detail::read_bibliography(file->json, bibliography_, report_);
            }
        }
        for (const detail::CslItem& source : bibliography_) {
            known_refs_.insert(source.item.id);
            rules_->bibliography.push_back(source.item);
        }
    }

    void declare_names() {
        declared_ = detail::declare(drafts_.entries, chosen_, *rules_, report_);
        for (const detail::RuleFile& file : drafts_.files) {
            detail::check_refs(file.document->json, known_refs_, report_);
        }
        detail::check_refs(analytes_->json, known_refs_, report_);
    }

    void read_entries() {
        const RuleNames names(*rules_);
        const detail::EntryContext context{*rules_, names, report_};
        // Conditions first: whether one can be empty decides whether `iif` may ask it.
        for (const bool conditions : {true, false}) {
            for (const detail::Declared& declared : declared_) {
                if ((declared.kind == EntryKind::condition) == conditions) {
                    detail::read_entry(declared, *rules_, context);
                }
            }
        }
    }

    void read_all_cases() {
        for (const detail::RuleFile& file : drafts_.files) {
            const detail::Document* document =
                documents_.read_if_present(cases_path_of(file.document->path));
            if (document == nullptr) {
                continue;
            }
            detail::check_refs(document->json, known_refs_, report_);
            const auto superseded = [&](std::string_view id) {
                const auto found = drafts_.superseded.find(id);
                return found != drafts_.superseded.end() && found->second > file.level;
            };
            std::ranges::move(read_cases(document->json, *rules_, superseded, report_),
                              std::back_inserter(rules_->cases));
        }
    }

    detail::Documents documents_;
    diag::Report& report_;
    std::size_t errors_before_;
    std::shared_ptr<RuleSet> rules_ = std::make_shared<RuleSet>();
    std::vector<detail::SetFile> chain_;
    detail::Drafts drafts_;
    detail::Chosen chosen_;
    std::vector<detail::Declared> declared_;
    const detail::Document* analytes_ = nullptr;
    std::vector<detail::CslItem> bibliography_;
    detail::Refs known_refs_;
};

}  // namespace

std::shared_ptr<const RuleSet> read_rule_set(const std::string& set_path,
                                             const FileReader& files,
                                             std::span<const ModelSignature> models,
                                             diag::Report& report,
                                             const ReadOptions& options) {
    return SetReader(files, report).read(set_path, models, options);
}

}  // namespace isohydric::rule
