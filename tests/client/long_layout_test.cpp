// One column of values and one of labels.
#include "command.h"
#include "expected.h"

#include <gtest/gtest.h>

namespace rankstead::client_tests {
namespace {

using Words = std::vector<std::string>;

Words with(Words words, const Words& more) {
    words.insert(words.end(), more.begin(), more.end());
    return words;
}

Words layout() {
    return {"--values", "minutes", "--labels", "period"};
}
Words periods() {
    return {"--before", "before", "--after", "after"};
}

Outcome groups(const Words& more) {
    return rankstead(with(with({"groups", "groups_long.csv"}, layout()), more));
}

Outcome pairs(const std::string& file, const Words& more) {
    return rankstead(with(with(with({"pairs", file}, layout()), periods()), more));
}

TEST(LongLayout, GroupsByLabel) {
    const Outcome outcome = groups({"--first", "old", "--second", "new", "--answer", "p", "--answer", "estimate"});
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_NEAR(std::stod(outcome.out), groups_p, 1e-15);
    EXPECT_TRUE(contains(outcome.out, "\n4.75\n"));
}

TEST(LongLayout, LabelsNameTheGroups) {
    const Outcome outcome = groups({"--first", "old", "--second", "new", "--answer", "sentence"});
    EXPECT_TRUE(contains(outcome.out, "old"));
    EXPECT_TRUE(contains(outcome.out, "new"));
}

TEST(LongLayout, PairsByIdentifierInAnyOrder) {
    const Outcome outcome =
        pairs("pairs_long.csv", {"--id", "patient", "--answer", "p", "--answer", "estimate", "--answer", "n"});
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_EQ(outcome.out, "0.02734375\n-5.25\n10\n");
}

TEST(LongLayout, APatientWithoutPartnerIsInTheLedger) {
    const Outcome outcome = pairs("pairs_long.csv", {"--id", "patient", "--answer", "ledger"});
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_TRUE(contains(outcome.out, "1 unpaired"));
}

TEST(LongLayout, PairsNeedIdentifiers) {
    EXPECT_TRUE(refused(pairs("pairs_long.csv", {}), 2, {"Add --id COLUMN"}));
}

TEST(LongLayout, GroupsTakeNoIdentifiers) {
    EXPECT_TRUE(refused(groups({"--first", "old", "--second", "new", "--id", "period"}), 2, {"leave --id out"}));
}

TEST(LongLayout, IdentifierTwice) {
    EXPECT_TRUE(refused(pairs("duplicate_id.csv", {"--id", "patient"}), 3,
                        {"duplicate_id.csv, column \"patient\": the identifier \"A1\" occurs twice for \"before\"",
                         "row 2 and row 6"}));
}

TEST(LongLayout, NoIdentifier) {
    EXPECT_TRUE(refused(pairs("no_id.csv", {"--id", "patient"}), 3,
                        {"no_id.csv, column \"patient\", row 4: there is no identifier"}));
}

TEST(LongLayout, ABadCellIsFoundInItsRow) {
    EXPECT_TRUE(refused(pairs("bad_long.csv", {"--id", "patient"}), 3,
                        {"bad_long.csv, column \"minutes\", row 5: ", "\"soon\""}));
}

TEST(LongLayout, UnknownLabel) {
    EXPECT_TRUE(refused(groups({"--first", "old", "--second", "newest"}), 2,
                        {"no row has \"newest\" in the column \"period\" (--second)", "\"old\", \"new\""}));
}

TEST(LongLayout, OneLabelTwice) {
    EXPECT_TRUE(refused(groups({"--first", "old", "--second", "old"}), 2, {"The label \"old\" is given for two"}));
}

TEST(LongLayout, UnknownColumns) {
    EXPECT_TRUE(refused(rankstead({"groups", "groups_long.csv", "--values", "hours", "--labels", "period", "--first",
                                   "old", "--second", "new"}),
                        2, {"no column \"hours\" (--values)", "\"period\", \"minutes\""}));
}

TEST(LongLayout, HalfALayout) {
    EXPECT_TRUE(
        refused(rankstead({"groups", "groups_long.csv", "--values", "minutes", "--first", "old", "--second", "new"}), 2,
                {"--labels is missing"}));
    EXPECT_TRUE(
        refused(rankstead({"groups", "groups_long.csv", "--labels", "period", "--first", "old", "--second", "new"}), 2,
                {"--values is missing"}));
}

TEST(LongLayout, RowsLeftOutAreToldWithASingleAnswerToo) {
    const Outcome outcome = pairs("pairs_long.csv", {"--id", "patient", "--answer", "n"});
    EXPECT_EQ(outcome.out, "10\n");
    EXPECT_TRUE(contains(outcome.err, "2 rows left out: another label, or none, in the column \"period\""));
}

} // namespace
} // namespace rankstead::client_tests
