#include "law_rows.h"

#include <iterator>
#include <utility>

namespace rankstead::bench {

std::vector<LawRow> law_rows() {
    std::vector<LawRow> rows = signed_rank_rows();
    std::vector<LawRow> more = rank_sum_rows();
    std::move(more.begin(), more.end(), std::back_inserter(rows));
    return rows;
}

} // namespace rankstead::bench
