// Through the C interface, as a spreadsheet's cells do it: an inquiry opened, given its data, run, asked and released.
#include "benchmarks.h"
#include "sampled_data.h"

#include "rankstead.h"

#include <array>
#include <memory>

namespace rankstead::bench {

namespace {

struct Named {
    const char* argument;
    std::vector<double> values;
};

struct Table {
    const char* study;
    std::array<Named, 2> data;

    // To data the memo has not seen, which are as much work: all values move together.
    void move() {
        for (Named& named : data) {
            for (double& value : named.values) {
                value += 1;
            }
        }
    }
};

Table groups(std::int64_t a_side, std::int64_t levels) {
    const TwoSamples samples = two_samples(a_side, a_side, levels);
    return {"groups", {{{"first", as_doubles(samples.first)}, {"second", as_doubles(samples.second)}}}};
}

Table pairs(std::int64_t n, std::int64_t levels) {
    const std::vector<double> before(static_cast<std::size_t>(n));
    return {"pairs", {{{"before", before}, {"after", as_doubles(changes(n, levels))}}}};
}

struct Release {
    void operator()(rks_inquiry* inquiry) const { rks_inquiry_free(inquiry); }
};

// One cell: the text of one answer is handed to `use`.
template <class Use>
void cell(const Table& table, const char* answer, Use use) {
    rks_inquiry* opened = nullptr;
    rks_inquiry_new(table.study, &opened);
    const std::unique_ptr<rks_inquiry, Release> inquiry(opened);
    for (const Named& named : table.data) {
        rks_inquiry_numbers(opened, named.argument, named.values.data(), named.values.size(), 1);
    }
    rks_inquiry_run(opened);
    const char* text = "";
    rks_inquiry_text(opened, answer, &text, nullptr);
    use(text);
}

void label_with_method(benchmark::State& state, const Table& table) {
    cell(table, "method", [&](const char* method) { state.SetLabel(method); });
}

void ask(const Table& table, const char* answer) {
    cell(table, answer, [](const char* text) { benchmark::DoNotOptimize(text); });
}

// The table goes on from one repetition to the next, or the memo would know its data again.
void register_new(const std::string& name, const Table& first, const std::vector<const char*>& answers) {
    benchmark::RegisterBenchmark(name.c_str(),
                                 [table = std::make_shared<Table>(first), answers](benchmark::State& state) {
                                     label_with_method(state, *table);
                                     for (auto _ : state) {
                                         table->move();
                                         for (const char* answer : answers) {
                                             ask(*table, answer);
                                         }
                                     }
                                 });
}

void register_known(const std::string& name, const Table& table) {
    benchmark::RegisterBenchmark(name.c_str(), [table](benchmark::State& state) {
        label_with_method(state, table);
        for (auto _ : state) {
            ask(table, "p");
        }
    });
}

} // namespace

void register_inquiries() {
    register_new("goal/0/one new inquiry through the C interface, no ties, 20 a side", groups(20, all_distinct), {"p"});
    register_new("goal/0/one new inquiry through the C interface, 13 levels, 20 a side", groups(20, 13), {"p"});
    register_known("goal/0/one inquiry known to the memo, 13 levels, 20 a side", groups(20, 13));
    // What calc_cells.py asks of a spreadsheet, without the spreadsheet.
    register_new("calc/10 answers on 18 pairs", pairs(18, 40),
                 {"p", "estimate", "lower", "upper", "n", "zeros", "method", "notes", "sentence", "check"});
    register_new("calc/1 answer on 13 levels, 1,000 a side", groups(1000, 13), {"p"});
}

} // namespace rankstead::bench
