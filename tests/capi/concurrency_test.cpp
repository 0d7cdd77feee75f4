// Results do not depend on threads, rounding mode or on what becomes of lent data after a run.
#include "inquiry.h"
#include "random_data.h"

#include <gtest/gtest.h>

#include <cfenv>
#include <clocale>
#include <cstring>
#include <thread>

namespace rks_test {
namespace {

constexpr std::size_t threads = 8, problems = 60;

// Every number answer of a random problem, bit by bit, and every text.
std::vector<std::string> answers_to(std::uint64_t seed) {
    RandomData random(seed);
    const auto first = doubles(random.tied(static_cast<std::size_t>(random.between(1, 30))));
    const auto second = doubles(random.tied(static_cast<std::size_t>(random.between(1, 30))));
    const auto inquiry = seed % 3 == 0 ? single(first, second.front()) : groups(first, second);
    std::vector<std::string> answers;
    for (std::size_t answer = 0; answer < rks_answer_count(); ++answer) {
        const char* word = rks_answer_word(answer);
        double value = inquiry.number(word);
        std::string bits(sizeof value, '\0');
        std::memcpy(bits.data(), &value, sizeof value);
        answers.push_back(bits + inquiry.text(word));
    }
    return answers;
}

TEST(Concurrency, eight_threads_get_identical_bits) {
    std::vector<std::vector<std::string>> alone(problems);
    for (std::size_t i = 0; i < problems; ++i)
        alone[i] = answers_to(i);
    std::vector<std::size_t> differing(threads, 0);
    std::vector<std::thread> running;
    for (std::size_t t = 0; t < threads; ++t)
        running.emplace_back([&, t] {
            for (std::size_t i = 0; i < problems; ++i)
                differing[t] += answers_to((i + 7 * t) % problems) != alone[(i + 7 * t) % problems] ? 1U : 0U;
        });
    for (auto& thread : running)
        thread.join();
    EXPECT_EQ(differing, std::vector<std::size_t>(threads, 0));
}

TEST(Concurrency, the_rounding_mode_of_the_host_does_not_matter) {
    std::vector<std::vector<std::string>> nearest(problems);
    for (std::size_t i = 0; i < problems; ++i)
        nearest[i] = answers_to(i + 1000);
    for (const int mode : {FE_UPWARD, FE_DOWNWARD, FE_TOWARDZERO}) {
        for (std::size_t i = 0; i < problems; ++i) {
            std::fesetround(mode);
            const auto rounded = answers_to(i + 1000);
            const int kept = std::fegetround();
            std::fesetround(FE_TONEAREST);
            EXPECT_EQ(rounded, nearest[i]) << "problem " << i;
            EXPECT_EQ(kept, mode) << "the mode of the host is given back";
        }
    }
}

// Asked in this mode first, so that no finished outcome can be remembered.
TEST(Concurrency, the_rounding_mode_does_not_matter_on_first_sight) {
    std::fesetround(FE_UPWARD);
    const auto upward = single({0.1, 0.7, 1.3, 2.9, -0.2, 5.7}, 0.2);
    std::fesetround(FE_TONEAREST);
    EXPECT_EQ(upward.number("p"), 10.0 / 64) << "T- = 3: five of 64 arrangements in a tail";
    EXPECT_EQ(upward.number("estimate"), 1.35);
}

TEST(Concurrency, the_locale_of_the_host_does_not_matter) {
    const auto plain = answers_to(5);
    for (const char* locale : {"de_DE.UTF-8", "fr_FR.UTF-8", "tr_TR.UTF-8", "C.UTF-8"})
        if (std::setlocale(LC_ALL, locale) != nullptr) {
            EXPECT_EQ(answers_to(5), plain) << locale;
            EXPECT_EQ(groups({1, 2, 3, 4}, {2, 3, 4, 9}, {{"level", "0.9"}, {"margin", "0.5"}}).status("p"), RKS_OK);
        }
    std::setlocale(LC_ALL, "C");
}

TEST(BorrowedData, are_not_touched_after_the_run) {
    auto values = std::make_unique<std::vector<double>>(std::vector<double>{1, 2, 3, 4, 5, 6, 7});
    auto heading = std::make_unique<std::string>("Alder ward");
    auto cells = std::make_unique<std::vector<rks_cell>>(
        std::vector<rks_cell>{text_cell(*heading), number_cell(3), number_cell(9)});
    Inquiry inquiry("groups");
    rks_inquiry_numbers(inquiry.handle(), "first", values->data(), values->size(), 1);
    rks_inquiry_cells(inquiry.handle(), "second", cells->data(), cells->size(), 1);
    ASSERT_EQ(inquiry.run(), RKS_OK) << inquiry.message();
    std::fill(values->begin(), values->end(), -1e300);
    values.reset();
    heading->assign("overwritten");
    heading.reset();
    cells.reset();
    const auto again = groups({1, 2, 3, 4, 5, 6, 7}, {3, 9});
    EXPECT_EQ(inquiry.number("p"), again.number("p"));
    EXPECT_EQ(inquiry.number("estimate"), again.number("estimate"));
    EXPECT_EQ(inquiry.number("median second"), 6);
    EXPECT_NE(inquiry.text("sentence").find("Alder ward"), std::string::npos);
    EXPECT_NE(inquiry.text("report"), inquiry.text("sentence"));
}

TEST(BorrowedData, a_failed_run_keeps_its_own_words) {
    auto text = std::make_unique<std::string>("lost reading");
    Inquiry inquiry("single");
    inquiry.cells("values", {number_cell(1), text_cell(*text)});
    inquiry.numbers("reference", {0});
    ASSERT_EQ(inquiry.run(), RKS_BAD_DATA);
    text->assign("xxxxxxxxxxxx");
    text.reset();
    EXPECT_NE(inquiry.text("check").find("lost reading"), std::string::npos) << inquiry.text("check");
}

} // namespace
} // namespace rks_test
