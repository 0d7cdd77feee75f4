// catalogue.h: studies and answers, and how words are looked up in them.
#include "catalogue.h"

#include "data.h"
#include "refusal.h"

#include <gtest/gtest.h>

#include <set>

namespace rankstead {
namespace {

const StudyRow& study(std::string_view word) {
    return *find_study(word);
}

template <class Act>
Refusal refusal_of(Act act) {
    try {
        act();
    } catch (const Refusal& refusal) {
        return refusal;
    }
    ADD_FAILURE() << "nothing was refused";
    return {Status::ok, ""};
}

TEST(Studies, are_found_by_their_word_however_it_is_written) {
    EXPECT_EQ(find_study(" Groups ")->id, StudyId::groups);
    EXPECT_EQ(find_study("PAIRS")->function, std::string("RKS.PAIRS"));
    EXPECT_EQ(find_study("several"), nullptr);
}

TEST(Studies, have_cell_functions_that_are_their_words_in_capitals) {
    for (const StudyRow& row : studies()) {
        std::string capitals = "RKS.";
        for (const char* c = row.word; *c != '\0'; ++c) {
            capitals += static_cast<char>(*c - 'a' + 'A');
        }
        EXPECT_EQ(row.function, capitals);
    }
}

TEST(Answers, are_found_by_label_and_by_alias) {
    EXPECT_STREQ(find_answer("P-Value:")->word, "p");
    EXPECT_STREQ(find_answer("Median (days)")->word, "median first");
    EXPECT_EQ(find_answer(""), nullptr);
    EXPECT_EQ(find_answer("(p)"), nullptr);
}

TEST(Answers, of_an_empty_label_are_the_default) {
    EXPECT_STREQ(answer_of(study("groups"), "  ").word, "sentence");
    EXPECT_STREQ(answer_of(study("build"), "").word, "build");
}

TEST(Answers, that_do_not_exist_are_refused_with_the_words_that_do) {
    const Refusal refusal = refusal_of([] { static_cast<void>(answer_of(study("groups"), "p-valeu")); });
    EXPECT_EQ(refusal.status(), Status::unknown_answer);
    EXPECT_EQ(refusal.message().rfind("there is no answer \"p-valeu\". The answers are sentence, estimate, ", 0), 0U)
        << refusal.message();
}

TEST(Answers, of_another_study_are_refused) {
    const Refusal refusal = refusal_of([] { static_cast<void>(answer_of(study("groups"), "zeros")); });
    EXPECT_EQ(refusal.message().rfind("there is no answer \"zeros\" of groups. The answers are ", 0), 0U)
        << refusal.message();
}

TEST(Answers, all_read_without_complaint_from_an_outcome_that_has_everything) {
    const Outcome outcome = test::groups({1, 3, 5, 7}, {2, 4, 6, 8});
    for (const AnswerRow& row : answers()) {
        if (fits(row.fits, study("groups"))) {
            EXPECT_FALSE(std::holds_alternative<NoAnswer>(row.read(outcome))) << row.word;
        }
    }
}

TEST(Answers, have_the_kind_that_their_row_says) {
    for (const Outcome& outcome :
         {test::groups({1, 3, 5, 7}, {2, 4, 6, 8}), test::changes({1, 2, 0, 4, 5}), test::single({1, 2, 2}, 2)}) {
        for (const AnswerRow& row : answers()) {
            if (!fits(row.fits, study_of(outcome))) {
                continue;
            }
            const Reading reading = row.read(outcome);
            EXPECT_EQ(std::holds_alternative<Table>(reading), row.kind == AnswerKind::table) << row.word;
            EXPECT_FALSE(std::holds_alternative<double>(reading) && row.kind != AnswerKind::number) << row.word;
            EXPECT_FALSE(std::holds_alternative<std::string>(reading) && row.kind != AnswerKind::text) << row.word;
        }
    }
}

TEST(Answers, that_no_double_can_hold_are_refused_and_never_given_as_zero) {
    // The shift from -1e308 to 1e308 is 2e308, beyond the largest double.
    const Outcome outcome = test::groups({1e308}, {-1e308});
    EXPECT_TRUE(std::holds_alternative<NoAnswer>(find_answer("estimate")->read(outcome)));
}

TEST(Report, has_every_answer_of_the_study_once_with_its_value) {
    const Outcome outcome = test::groups({1, 3, 5, 7}, {2, 4, 6, 8});
    const auto table = std::get<Table>(find_answer("report")->read(outcome));
    ASSERT_EQ(table.columns, 2U);
    std::set<std::string> words;
    for (std::size_t i = 0; i < table.cells.size(); i += 2) {
        words.insert(std::get<std::string>(table.cells[i]));
    }
    std::size_t expected = 0;
    for (const AnswerRow& row : answers()) {
        expected += row.kind != AnswerKind::table && fits(row.fits, study("groups")) ? 1U : 0U;
    }
    EXPECT_EQ(words.size(), expected);
    EXPECT_EQ(table.cells.size(), 2 * expected);
}

TEST(Build, gives_the_version_line) {
    const Outcome outcome = study("build").run({}, {});
    EXPECT_EQ(test::text_answer(outcome, "").rfind("Rankstead ", 0), 0U);
}

} // namespace
} // namespace rankstead
