// The entry of every doctest program. A run in which no test case ran is a failure.
#define DOCTEST_CONFIG_IMPLEMENT
#include <doctest/doctest.h>

namespace {

unsigned test_cases_run = 0;

/// Counts; doctest itself calls a run without test cases a success.
struct CountingListener : doctest::IReporter {
    explicit CountingListener(const doctest::ContextOptions&) {}

    void report_query(const doctest::QueryData&) override {}

    void test_run_start() override {}

    void test_run_end(const doctest::TestRunStats& stats) override {
        test_cases_run = stats.numTestCasesPassingFilters;
    }

    void test_case_start(const doctest::TestCaseData&) override {}

    void test_case_reenter(const doctest::TestCaseData&) override {}

    void test_case_end(const doctest::CurrentTestCaseStats&) override {}

    void test_case_exception(const doctest::TestCaseException&) override {}

    void subcase_start(const doctest::SubcaseSignature&) override {}

    void subcase_end() override {}

    void log_assert(const doctest::AssertData&) override {}

    void log_message(const doctest::MessageData&) override {}

    void test_case_skipped(const doctest::TestCaseData&) override {}
};

}  // namespace

REGISTER_LISTENER("counting", 1, CountingListener);

int main(int argc, char** argv) {
    doctest::Context context(argc, argv);
    const int result = context.run();
    if (context.shouldExit()) {
        return result;
    }
    return result != 0 || test_cases_run == 0 ? 1 : 0;
}
