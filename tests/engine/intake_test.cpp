// intake.h: where cells become numbers, and where every cell went.
#include "intake.h"

#include "data.h"
#include "refusal.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

namespace rankstead {
namespace {

using test::blank;
using test::cells;
using test::column;
using test::number;
using test::text;

void expect_balanced(const Ledger& ledger) {
    EXPECT_EQ(ledger.seen,
              ledger.used + ledger.blank + ledger.heading + ledger.missing_words + ledger.censored + ledger.unpaired)
        << ledger.argument;
}

// What a reading is refused with.
template <class Read>
Refusal refusal_of(Read read) {
    try {
        read();
    } catch (const Refusal& refusal) {
        return refusal;
    }
    ADD_FAILURE() << "nothing was refused";
    return {Status::ok, ""};
}

Refusal column_refusal(std::vector<Cell> list, const Settings& settings = {}) {
    return refusal_of([&] { static_cast<void>(read_column(cells("values", std::move(list)), settings)); });
}

bool mentions(const Refusal& refusal, std::string_view words) {
    return refusal.message().find(words) != std::string::npos;
}

TEST(ReadColumn, takes_numbers_in_the_order_of_the_cells) {
    const Column read = read_column(column("values", {3, 1.5, -2}), {});
    EXPECT_EQ(read.values, (std::vector<Decimal>{{3, 0}, {15, -1}, {-2, 0}}));
    EXPECT_EQ(read.ledger.used, 3U);
}

TEST(ReadColumn, never_takes_a_blank_for_a_zero) {
    const Column read = read_column(cells("values", {blank(), text(""), text(" \xC2\xA0"), number(0)}), {});
    EXPECT_EQ(read.values, (std::vector<Decimal>{{}}));
    EXPECT_EQ(read.ledger.blank, 3U);
    expect_balanced(read.ledger);
}

TEST(ReadColumn, does_not_count_blanks_after_the_last_filled_cell) {
    const Column read = read_column(cells("values", {number(1), blank(), number(2), blank(), text(" "), blank()}), {});
    EXPECT_EQ(read.ledger.seen, 3U);
    EXPECT_EQ(read.ledger.blank, 1U);
    expect_balanced(read.ledger);
}

TEST(ReadColumn, takes_a_text_above_numbers_for_the_heading) {
    const Column read = read_column(cells("values", {text("Minutes waited"), number(4), number(5)}), {});
    EXPECT_EQ(read.heading, "Minutes waited");
    EXPECT_EQ(read.ledger.heading, 1U);
    EXPECT_EQ(read.ledger.used, 2U);
    expect_balanced(read.ledger);
}

TEST(ReadColumn, does_not_take_a_later_text_for_a_heading) {
    const Refusal refusal = column_refusal({number(4), text("Minutes"), number(5)});
    EXPECT_EQ(refusal.status(), Status::bad_data);
    ASSERT_TRUE(refusal.place());
    EXPECT_EQ(refusal.place()->row, 2U);
    EXPECT_TRUE(mentions(refusal, "\"Minutes\" is text, not a number"));
}

TEST(ReadColumn, does_not_take_a_missing_word_on_top_for_a_heading) {
    for (const char* word : {"n/a", "NA", "missing", "ND"}) {
        EXPECT_EQ(column_refusal({text(word), number(5)}).status(), Status::bad_data) << word;
    }
}

TEST(ReadColumn, leaves_out_words_declared_missing_and_counts_them) {
    Settings settings;
    settings.missing = {"n/a", "not done"};
    const Column read = read_column(cells("values", {number(1), text("N/A"), text("Not-done "), number(2)}), settings);
    EXPECT_EQ(read.ledger.missing_words, 2U);
    EXPECT_EQ(read.ledger.used, 2U);
    expect_balanced(read.ledger);
}

TEST(ReadColumn, refuses_a_value_beyond_a_limit_with_its_position) {
    for (const char* words : {"<0.5", ">100", "\xE2\x89\xA4 3", "\xE2\x89\xA5 3"}) {
        const Refusal refusal = column_refusal({number(1), text(words)});
        EXPECT_EQ(refusal.message().rfind("values, row 2: ", 0), 0U) << refusal.message();
        EXPECT_TRUE(mentions(refusal, "beyond a limit")) << refusal.message();
    }
}

TEST(ReadColumn, refuses_a_value_beyond_a_limit_in_the_first_cell_too) {
    EXPECT_TRUE(mentions(column_refusal({text("<0.5"), number(1)}), "beyond a limit"));
}

TEST(ReadColumn, never_guesses_that_a_text_is_a_number) {
    EXPECT_TRUE(mentions(column_refusal({number(1), text("3.5")}), "text that looks like a number"));
    EXPECT_TRUE(mentions(column_refusal({text("3,5"), number(1)}), "text that looks like a number"));
}

TEST(ReadColumn, reads_number_texts_under_the_setting) {
    Settings settings;
    settings.numbers = NumberTexts::comma;
    const Column read = read_column(cells("values", {text("3,5"), number(1)}), settings);
    EXPECT_EQ(read.values.front(), (Decimal{35, -1}));
    EXPECT_EQ(column_refusal({number(1), text("3.5")}, settings).status(), Status::bad_data);
    settings.numbers = NumberTexts::point;
    EXPECT_EQ(read_column(cells("values", {text("3.5")}), settings).values.front(), (Decimal{35, -1}));
}

TEST(ReadColumn, refuses_not_a_number_and_infinities_by_position) {
    const double infinity = std::numeric_limits<double>::infinity();
    EXPECT_TRUE(mentions(column_refusal({number(1), number(std::nan(""))}), "values, row 2: this is not a number"));
    EXPECT_TRUE(mentions(column_refusal({number(infinity)}), "values, row 1: this number is infinite"));
    EXPECT_TRUE(mentions(column_refusal({number(-infinity)}), "infinite"));
}

TEST(ReadColumn, names_row_and_column_in_a_block_read_row_by_row) {
    const Block block{"values", {number(1), number(2), number(3), number(4), text("x"), number(6)}, 2, 3};
    const Refusal refusal = refusal_of([&] { static_cast<void>(read_column(block, {})); });
    EXPECT_TRUE(mentions(refusal, "values, row 2, column 2: ")) << refusal.message();
}

TEST(ReadColumn, refuses_text_that_is_not_utf8) {
    EXPECT_TRUE(mentions(column_refusal({number(1), text("\xFFquot")}), "not valid UTF-8"));
}

TEST(ReadColumn, refuses_a_range_without_one_value) {
    const Refusal refusal = column_refusal({blank(), blank()});
    EXPECT_EQ(refusal.status(), Status::no_data);
    EXPECT_TRUE(mentions(refusal, "not one value among its 2 cells"));
}

TEST(ReadColumn, refuses_a_heading_above_nothing_but_blanks_for_want_of_values) {
    const Refusal refusal = column_refusal({text("Heading"), blank(), blank()});
    EXPECT_EQ(refusal.status(), Status::no_data);
    EXPECT_TRUE(mentions(refusal, "not one value among its 3 cells"));
}

TEST(ReadColumn, quotes_no_more_than_the_beginning_of_a_long_text) {
    // The cut at 40 bytes would fall into the middle of a character.
    const std::string words = "a" + std::string(60, 'x') + "\xC3\xA9";
    std::string accents = "a";
    for (int i = 0; i < 40; ++i) {
        accents += "\xC3\xA9";
    }
    EXPECT_TRUE(mentions(column_refusal({number(1), text(words)}), "\"" + words.substr(0, 40) + "...\""));
    EXPECT_TRUE(mentions(column_refusal({number(1), text(accents)}), "\"" + accents.substr(0, 39) + "...\""));
}

TEST(ReadPairs, keeps_only_the_rows_with_both_values) {
    const PairedColumns pairs = read_pairs(cells("before", {number(1), blank(), number(3), blank()}),
                                           cells("after", {number(2), number(5), blank(), blank()}), {});
    EXPECT_EQ(pairs.first.values, (std::vector<Decimal>{{1, 0}}));
    EXPECT_EQ(pairs.second.values, (std::vector<Decimal>{{2, 0}}));
    EXPECT_EQ(pairs.first.ledger.unpaired, 1U);
    EXPECT_EQ(pairs.second.ledger.unpaired, 1U);
    expect_balanced(pairs.first.ledger);
    expect_balanced(pairs.second.ledger);
}

TEST(ReadPairs, refuses_ranges_of_unequal_length) {
    const Refusal refusal = refusal_of([] {
        static_cast<void>(read_pairs(column("before", {1, 2, 3}), column("after", {1, 2}), {}));
    });
    EXPECT_EQ(refusal.status(), Status::unequal_lengths);
    EXPECT_TRUE(mentions(refusal, "before has 3 cells and after has 2"));
}

TEST(ReadPairs, refuses_a_heading_beside_a_number) {
    const Refusal refusal = refusal_of([] {
        static_cast<void>(
            read_pairs(cells("before", {number(9), number(1)}), cells("after", {text("After"), number(2)}), {}));
    });
    EXPECT_EQ(refusal.status(), Status::bad_data);
    ASSERT_TRUE(refusal.place());
    EXPECT_EQ(refusal.place()->argument, "before");
    EXPECT_EQ(refusal.place()->row, 1U);
}

TEST(ReadPairs, takes_a_heading_on_one_side_beside_a_blank) {
    const PairedColumns pairs =
        read_pairs(cells("before", {blank(), number(1)}), cells("after", {text("After"), number(2)}), {});
    EXPECT_EQ(pairs.second.heading, "After");
    EXPECT_EQ(pairs.first.values.size(), 1U);
}

TEST(ReadPairs, counts_pairs_that_differ_only_beyond_the_fifteenth_digit) {
    const PairedColumns pairs = read_pairs(column("before", {0.3, 1, 5}), column("after", {0.1 + 0.2, 1, 6}), {});
    EXPECT_EQ(pairs.equal_at_fifteen_digits, 1U);
}

TEST(ReadPairs, refuses_pairs_of_which_not_one_is_complete) {
    const Refusal refusal = refusal_of([] {
        static_cast<void>(read_pairs(cells("before", {number(9), blank()}), cells("after", {blank(), number(2)}), {}));
    });
    EXPECT_EQ(refusal.status(), Status::no_data);
}

TEST(ReadNumber, takes_a_single_number_below_a_heading) {
    EXPECT_EQ(read_number(cells("reference", {text("Target"), number(12.5)}), {}), (Decimal{125, -1}));
}

TEST(ReadNumber, refuses_several_numbers) {
    const Refusal refusal = refusal_of([] { static_cast<void>(read_number(column("reference", {1, 2}), {})); });
    EXPECT_EQ(refusal.status(), Status::bad_data);
    EXPECT_TRUE(mentions(refusal, "reference must be a single number, but there are 2"));
}

} // namespace
} // namespace rankstead
