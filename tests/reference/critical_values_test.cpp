// Every row of crit_signed_rank.csv and crit_rank_sum.csv (sources in SOURCES.md) through the law calls.
#include <rankstead.h>

#include <gtest/gtest.h>

#include <cmath>
#include <fstream>
#include <sstream>
#include <string>
#include <vector>

namespace rks_test {
namespace {

using Row = std::vector<std::string>;

std::vector<Row> rows_of(const std::string& name) {
    std::ifstream file(RANKSTEAD_REFERENCE_DIR "/" + name);
    std::vector<Row> rows;
    std::string line;
    std::getline(file, line); // the heading
    while (std::getline(file, line)) {
        Row row;
        std::istringstream fields(line);
        for (std::string field; std::getline(fields, field, ',');)
            row.push_back(field);
        rows.push_back(row);
    }
    return rows;
}

// An empty field stands for a value that does not exist.
void expect_critical(const std::string& field, double critical) {
    if (field.empty())
        EXPECT_TRUE(std::isnan(critical)) << critical;
    else
        EXPECT_EQ(critical, std::stod(field));
}

void expect_probability(const std::string& field, double p) {
    const double printed = std::stod(field);
    EXPECT_NEAR(p, printed, 1e-12 * printed);
}

// The law of one design, so that one check serves both files.
struct SignedRank {
    std::size_t n;
    double largest() const { return static_cast<double>(n * (n + 1) / 2); }
    double critical(double alpha, int32_t side) const {
        double value = 0;
        EXPECT_EQ(rks_signed_rank_critical(n, alpha, side, &value), RKS_OK);
        return value;
    }
    double lower_tail(double statistic) const {
        double p = 0;
        EXPECT_EQ(rks_signed_rank_tail(n, statistic, -1, &p), RKS_OK);
        return p;
    }
};

struct RankSum {
    std::size_t m, n;
    double largest() const { return static_cast<double>(m * n); }
    double critical(double alpha, int32_t side) const {
        double value = 0;
        EXPECT_EQ(rks_rank_sum_critical(m, n, alpha, side, &value), RKS_OK);
        return value;
    }
    double lower_tail(double statistic) const {
        double p = 0;
        EXPECT_EQ(rks_rank_sum_tail(m, n, statistic, -1, &p), RKS_OK);
        return p;
    }
};

struct Expected {
    double alpha_one_sided, alpha_two_sided;
    std::string critical, reached, next;
};

template <class Law>
void expect_row(const Law& law, const Expected& row) {
    expect_critical(row.critical, law.critical(row.alpha_one_sided, -1));
    expect_critical(row.critical, law.critical(row.alpha_two_sided, 0));
    const double upper = law.critical(row.alpha_one_sided, 1);
    expect_critical(row.critical, law.largest() - upper);
    if (!row.critical.empty())
        expect_probability(row.reached, law.lower_tail(std::stod(row.critical)));
    expect_probability(row.next, law.lower_tail(row.critical.empty() ? 0 : std::stod(row.critical) + 1));
}

TEST(CriticalValues, every_row_of_the_signed_rank_table) {
    const auto rows = rows_of("crit_signed_rank.csv");
    EXPECT_EQ(rows.size(), 406U);
    for (const auto& row : rows) {
        SCOPED_TRACE("n = " + row.at(0) + ", one-sided " + row.at(1));
        expect_row(SignedRank{std::stoul(row[0])}, {std::stod(row[1]), std::stod(row[2]), row[3], row[4], row[5]});
    }
}

TEST(CriticalValues, every_row_of_the_rank_sum_table) {
    const auto rows = rows_of("crit_rank_sum.csv");
    EXPECT_EQ(rows.size(), 2275U);
    for (const auto& row : rows) {
        SCOPED_TRACE(row.at(0) + " v " + row.at(1) + ", one-sided " + row.at(2));
        const RankSum law{std::stoul(row[0]), std::stoul(row[1])};
        expect_row(law, {std::stod(row[2]), std::stod(row[3]), row[4], row[6], row[7]});
        const double ranks = static_cast<double>(law.m * (law.m + 1) / 2);
        expect_critical(row[5], law.critical(std::stod(row[2]), -1) + ranks);
    }
}

} // namespace
} // namespace rks_test
