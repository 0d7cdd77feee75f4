// The laws by themselves. The critical values of n = 10 (10 at 5 %, 5 at 1 %, one-sided) and of 8 and 10 (rank sums 53
// and 99, two-sided 5 %) are those of the usual printed tables; probabilities are counts of arrangements: 25 of the
// 2^10 subsets of 1..10 have a sum of at most 8; SciPy 1.10.1 counts 8,932 of the 43,758 arrangements with U <= 30.
#include "command.h"

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

namespace rankstead::client_tests {
namespace {

using Words = std::vector<std::string>;

double number(const Words& words) {
    const Outcome outcome = rankstead(words);
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    return as_number(outcome.out);
}

TEST(Laws, TailOfSignedRank) {
    EXPECT_NEAR(number({"tail", "signed-rank", "--n", "10", "--statistic", "8", "--side", "lower"}), 25.0 / 1024,
                1e-16);
    EXPECT_NEAR(number({"tail", "signed-rank", "--n=10", "--statistic=8"}), 50.0 / 1024, 1e-16);
    EXPECT_NEAR(number({"tail", "signed-rank", "-n", "10", "--statistic", "47", "--side", "higher"}), 25.0 / 1024,
                1e-16);
}

TEST(Laws, TailOfRankSum) {
    const Words words{"tail", "rank-sum", "--first-size", "8", "--second-size", "10", "--statistic", "30"};
    EXPECT_NEAR(number(words), 2 * 8932.0 / 43758, 1e-15);
}

TEST(Laws, CriticalOfSignedRank) {
    EXPECT_EQ(number({"critical", "signed-rank", "--n", "10", "--alpha", "0.05", "--side", "lower"}), 10);
    EXPECT_EQ(number({"critical", "signed-rank", "--n", "10", "--alpha", "0.01", "--side", "lower"}), 5);
    EXPECT_EQ(number({"critical", "signed-rank", "--n", "10", "--alpha", "0.05", "--side", "higher"}), 45);
}

TEST(Laws, CriticalOfRankSum) {
    const double u = number({"critical", "rank-sum", "--first-size", "8", "--second-size", "10", "--alpha", "0.05"});
    EXPECT_EQ(u + 8 * 9 / 2.0, 53);
}

TEST(Laws, WhereNoCriticalValueExists) {
    EXPECT_TRUE(refused(rankstead({"critical", "signed-rank", "--n", "4", "--alpha", "0.01"}), 3, {"0.01 or less"}));
    const Outcome outcome = rankstead({"critical", "signed-rank", "--n", "4", "--alpha", "0.01", "--json"});
    EXPECT_EQ(outcome.status, 3);
    EXPECT_TRUE(nlohmann::json::parse(outcome.out).at("critical").is_null());
}

TEST(Laws, Json) {
    const Outcome outcome =
        rankstead({"tail", "signed-rank", "--n", "10", "--statistic", "8", "--side", "lower", "--json"});
    const auto object = nlohmann::json::parse(outcome.out);
    EXPECT_EQ(object,
              nlohmann::json::parse(R"({"law":"signed-rank","n":10,"statistic":8,"side":"lower","p":0.0244140625})"));
}

TEST(Laws, BadNumbers) {
    for (const char* statistic : {"56", "-1", "7.5"}) {
        EXPECT_TRUE(refused(rankstead({"tail", "signed-rank", "--n", "10", "--statistic", statistic}), 2,
                            {"a whole number from 0 to 55"}));
    }
    EXPECT_TRUE(
        refused(rankstead({"tail", "signed-rank", "--n", "ten", "--statistic", "8"}), 2, {"--n takes a whole"}));
    EXPECT_TRUE(refused(rankstead({"tail", "signed-rank", "--n", "10", "--statistic", "8,5"}), 2,
                        {"--statistic takes a number with a decimal point"}));
    EXPECT_TRUE(
        refused(rankstead({"critical", "signed-rank", "--n", "10", "--alpha", "5"}), 2, {"above 0 and below 1"}));
}

TEST(Laws, SampleSizeOfZero) {
    EXPECT_EQ(rankstead({"tail", "signed-rank", "--n", "0", "--statistic", "0"}).status, 3);
}

TEST(Laws, BadWords) {
    EXPECT_TRUE(refused(rankstead({"tail"}), 2, {"signed-rank or rank-sum"}));
    EXPECT_TRUE(refused(rankstead({"tail", "sum"}), 2, {"There is no law \"sum\"", "signed-rank, rank-sum"}));
    EXPECT_TRUE(refused(rankstead({"tail", "signed-rank", "--n", "10", "--statistic", "8", "--side", "left"}), 2,
                        {"--side takes two-sided, higher, lower"}));
    EXPECT_TRUE(refused(rankstead({"tail", "signed-rank", "--n", "10"}), 2, {"--statistic is missing"}));
    EXPECT_TRUE(refused(rankstead({"tail", "signed-rank", "ten"}), 2, {"\"ten\" is not an option"}));
}

TEST(Laws, Help) {
    EXPECT_TRUE(contains(rankstead({"tail", "--help"}).out, "rankstead tail rank-sum --help"));
    EXPECT_TRUE(contains(rankstead({"critical", "rank-sum", "--help"}).out, "--first-size COUNT"));
}

} // namespace
} // namespace rankstead::client_tests
