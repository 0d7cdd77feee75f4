// Runs every shape, or those whose name contains the word given, and prints what came of them as a table in Markdown,
// then each case that is wrong or has no law.
#include "shapes.h"
#include "trial_effort.h"

#include <cstdio>
#include <string_view>

namespace {

using namespace rankstead::accuracy;

void print_list(const char* title, const std::vector<std::string>& cases) {
    for (const std::string& one : cases) {
        std::printf("%s: %s\n", title, one.c_str());
    }
}

template <class Shape>
void run(const std::vector<Shape>& shapes, std::string_view word, std::vector<Tally>& tallies) {
    for (const Shape& shape : shapes) {
        if (shape.name.find(word) == std::string::npos) {
            continue;
        }
        tallies.push_back(trial(shape, trial_effort()));
        std::puts(tallies.back().row().c_str());
        std::fflush(stdout); // it takes a while
    }
}

} // namespace

int main(int argc, char** argv) {
    const std::string_view word = argc > 1 ? argv[1] : "";
    std::puts(table_head);
    std::vector<Tally> tallies;
    run(sign_shapes(), word, tallies);
    run(choice_shapes(), word, tallies);
    int cases = 0;
    for (const Tally& tally : tallies) {
        cases += tally.cases;
        print_list("wrong", tally.wrong);
        print_list("no law", tally.without_law);
    }
    std::printf("%d cases\n", cases);
    return 0;
}
