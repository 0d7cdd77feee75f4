// The ledger accounts for every cell, and equal stamps mean equal results.
#include "inquiry.h"
#include "random_data.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <map>
#include <sstream>

namespace rks_test {
namespace {

using Account = std::map<std::string, long>; // "seen" -> 20, "used" -> 17, ...

// "20 seen = 17 used + 2 blank + 1 text + 0 censored + 0 unpaired (text: ...)": numbers, each before its word.
Account read_account(std::string part) {
    part.erase(std::min(part.find('('), part.size()));
    part.erase(std::remove(part.begin(), part.end(), ','), part.end());
    for (char& letter : part)
        if (letter == '=' || letter == '+')
            letter = ' ';
    std::istringstream words(part);
    Account account;
    std::string word;
    for (long number = 0; words >> number >> word;)
        account[word] = number;
    return account;
}

// "first: 20 seen = ...; second: ..."
std::map<std::string, Account> read_ledger(const std::string& ledger) {
    std::map<std::string, Account> accounts;
    std::istringstream parts(ledger);
    for (std::string part; std::getline(parts >> std::ws, part, ';');) {
        const auto colon = part.find(':');
        if (colon != std::string::npos)
            accounts[part.substr(0, colon)] = read_account(part.substr(colon + 1));
    }
    return accounts;
}

void expect_balanced(Account account, long seen) {
    EXPECT_EQ(account["seen"], seen);
    EXPECT_EQ(account["seen"],
              account["used"] + account["blank"] + account["text"] + account["censored"] + account["unpaired"]);
}

TEST(Ledger, counts_a_heading_a_missing_word_and_blanks) {
    Inquiry inquiry("groups");
    inquiry.cells("first", {text_cell("Ward"), number_cell(3), blank_cell(), text_cell("n/a"), number_cell(5)});
    inquiry.cells("second", {blank_cell(), blank_cell(), number_cell(1)});
    inquiry.set("missing", "n/a");
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    auto accounts = read_ledger(inquiry.text("ledger"));
    expect_balanced(accounts["first"], 5);
    EXPECT_EQ(accounts["first"]["used"], 2);
    EXPECT_EQ(accounts["first"]["blank"], 1);
    EXPECT_EQ(accounts["first"]["text"], 2);
    expect_balanced(accounts["second"], 3);
    EXPECT_EQ(accounts["second"]["used"], 1);
}

rks_cell random_cell(RandomData& random) {
    const auto kind = random.between(0, 9);
    if (kind == 0)
        return blank_cell();
    if (kind == 1)
        return text_cell("n/a");
    return number_cell(static_cast<double>(random.between(-5, 5)));
}

std::vector<rks_cell> random_cells(RandomData& random, std::size_t size, bool heading) {
    std::vector<rks_cell> cells = {heading ? text_cell("minutes") : number_cell(1)};
    while (cells.size() < size)
        cells.push_back(random_cell(random));
    return cells;
}

TEST(Ledger, accounts_for_every_cell_of_pairs) {
    RandomData random(41);
    for (int round = 0; round < 200; ++round) {
        const auto size = static_cast<std::size_t>(random.between(2, 40));
        const bool heading = random.between(0, 1) == 1;
        auto before = random_cells(random, size, heading), after = random_cells(random, size, heading);
        before.back() = after.back() = number_cell(2); // one complete pair at least
        long complete = 0;
        for (std::size_t i = 0; i < size; ++i)
            complete += before[i].kind == RKS_CELL_NUMBER && after[i].kind == RKS_CELL_NUMBER ? 1 : 0;
        Inquiry inquiry("pairs");
        inquiry.cells("before", before);
        inquiry.cells("after", after);
        inquiry.set("missing", "n/a");
        ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
        auto accounts = read_ledger(inquiry.text("ledger"));
        for (const char* argument : {"before", "after"}) {
            expect_balanced(accounts[argument], static_cast<long>(size));
            EXPECT_EQ(accounts[argument]["used"], complete) << inquiry.text("ledger");
        }
    }
}

TEST(Ledger, accounts_for_every_cell_of_groups) {
    RandomData random(42);
    for (int round = 0; round < 200; ++round) {
        Inquiry inquiry("groups");
        std::map<std::string, long> numbers, sizes;
        for (const char* argument : {"first", "second"}) {
            auto cells =
                random_cells(random, static_cast<std::size_t>(random.between(2, 40)), random.between(0, 1) == 1);
            cells.back() = number_cell(3);
            for (const auto& cell : cells)
                numbers[argument] += cell.kind == RKS_CELL_NUMBER ? 1 : 0;
            sizes[argument] = static_cast<long>(cells.size());
            inquiry.cells(argument, cells);
        }
        inquiry.set("missing", "n/a");
        ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
        auto accounts = read_ledger(inquiry.text("ledger"));
        for (const char* argument : {"first", "second"}) {
            expect_balanced(accounts[argument], sizes[argument]);
            EXPECT_EQ(accounts[argument]["used"], numbers[argument]) << inquiry.text("ledger");
            EXPECT_EQ(inquiry.number(std::string("n ") + argument), static_cast<double>(numbers[argument]));
        }
    }
}

TEST(Stamp, equal_data_and_settings_have_equal_stamps) {
    const auto stamp = groups({1, 2, 3}, {2, 4}).text("stamp");
    EXPECT_FALSE(stamp.empty());
    EXPECT_EQ(stamp, groups({1, 2, 3}, {2, 4}).text("stamp"));
    EXPECT_EQ(stamp, groups({1, 2, 3}, {2, 4}, {{"side", "two-sided"}, {"level", "95%"}}).text("stamp"));
    Inquiry cells("groups");
    cells.cells("first", {number_cell(1), number_cell(2), number_cell(3)});
    cells.numbers("second", {2, 4});
    ASSERT_EQ(cells.run(), RKS_OK);
    EXPECT_EQ(stamp, cells.text("stamp"));
}

TEST(Stamp, any_change_of_data_or_settings_changes_it) {
    const auto stamp = groups({1, 2, 3}, {2, 4}).text("stamp");
    EXPECT_NE(stamp, groups({1, 2, 3.000001}, {2, 4}).text("stamp"));
    EXPECT_NE(stamp, groups({1, 2}, {3, 2, 4}).text("stamp"));
    EXPECT_NE(stamp, groups({2, 4}, {1, 2, 3}).text("stamp"));
    EXPECT_NE(stamp, groups({1, 2, 3}, {2, 4}, {{"side", "higher"}}).text("stamp"));
    EXPECT_NE(stamp, groups({1, 2, 3}, {2, 4}, {{"level", "0.9"}}).text("stamp"));
    EXPECT_NE(stamp, groups({1, 2, 3}, {2, 4}, {{"margin", "0.5"}}).text("stamp"));
    EXPECT_NE(pairs({1, 2}, {3, 4}).text("stamp"), groups({1, 2}, {3, 4}).text("stamp"));
}

} // namespace
} // namespace rks_test
