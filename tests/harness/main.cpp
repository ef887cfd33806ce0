// The entry of every doctest program. A run that matches no test case is a failure.
#define DOCTEST_CONFIG_IMPLEMENT
#include <doctest/doctest.h>

int main(int argc, char** argv) {
    doctest::Context context(argc, argv);
    const int failed = context.run();
    if (context.shouldExit()) {
        return failed;
    }
    return doctest::getContextOptions() == nullptr ? 1 : failed;
}
