// The true relative error of each p of the table of goals, against whole numbers, as lines `row <tab> error`. Rows that
// would take more additions than the first argument says are left out.
#include "law_rows.h"

#include "laws/exact_laws.h"

#include <cstdlib>
#include <iostream>

int main(int count, char** arguments) {
    using namespace rankstead;
    const double most_work = count > 1 ? std::strtod(arguments[1], nullptr) : 5e9;
    for (const bench::LawRow& row : bench::law_rows()) {
        if (!row.exact || row.exact->work > most_work) {
            continue;
        }
        try {
            const Tails tails = row.tails();
            const test::BigTails exact = row.exact->tails();
            const bool lower = tails.lower <= tails.upper; // the bound is on the smaller tail
            std::cout << row.what << '\t'
                      << test::relative_error(lower ? tails.lower : tails.upper, lower ? exact.lower : exact.upper,
                                              exact.total)
                      << std::endl;
        } catch (const LawTooLong&) {
            continue; // no exact law, no error
        }
    }
}
