// capi/memo.h: finished outcomes, bounded, least recently used first to go.
#include "memo.h"

#include <gtest/gtest.h>

#include <atomic>
#include <thread>
#include <vector>

namespace rankstead {
namespace {

// An outcome that can be told from others.
std::shared_ptr<const Outcome> marked(double p) {
    Outcome outcome;
    outcome.p = p;
    return std::make_shared<const Outcome>(outcome);
}

TEST(Memo, gives_back_what_was_kept) {
    Memo memo(10, 1000);
    const auto outcome = marked(0.25);
    memo.keep("key", outcome);
    EXPECT_EQ(memo.find("key"), outcome);
    EXPECT_EQ(memo.entries(), 1U);
}

TEST(Memo, has_nothing_for_a_key_that_was_never_kept) {
    Memo memo(10, 1000);
    memo.keep("key", marked(0.25));
    EXPECT_EQ(memo.find("other"), nullptr);
    EXPECT_EQ(memo.find(""), nullptr);
}

TEST(Memo, compares_keys_in_full) {
    Memo memo(10, 10000);
    const std::string beginning(2000, 'x');
    memo.keep(beginning + "a", marked(0.1));
    memo.keep(beginning + "b", marked(0.2));
    EXPECT_EQ(memo.find(beginning + "a")->p, 0.1);
    EXPECT_EQ(memo.find(beginning + "b")->p, 0.2);
    EXPECT_EQ(memo.find(beginning), nullptr);
}

TEST(Memo, compares_keys_beyond_a_zero_byte) {
    Memo memo(10, 1000);
    const std::string one("a\0b", 3);
    const std::string other("a\0c", 3);
    memo.keep(one, marked(0.1));
    EXPECT_EQ(memo.find(other), nullptr);
    EXPECT_EQ(memo.find("a"), nullptr);
    EXPECT_EQ(memo.find(one)->p, 0.1);
}

TEST(Memo, keeps_the_first_outcome_of_a_key) {
    Memo memo(10, 1000);
    memo.keep("key", marked(0.1));
    memo.keep("key", marked(0.2));
    EXPECT_EQ(memo.find("key")->p, 0.1);
    EXPECT_EQ(memo.entries(), 1U);
}

TEST(Memo, never_holds_more_entries_than_it_may) {
    Memo memo(3, 1000);
    for (int i = 0; i < 20; ++i) {
        memo.keep("key " + std::to_string(i), marked(i));
        EXPECT_LE(memo.entries(), 3U);
    }
    EXPECT_EQ(memo.find("key 16"), nullptr);
    EXPECT_EQ(memo.find("key 17")->p, 17);
    EXPECT_EQ(memo.find("key 19")->p, 19);
}

TEST(Memo, drops_the_least_recently_used_first) {
    Memo memo(3, 1000);
    memo.keep("a", marked(1));
    memo.keep("b", marked(2));
    memo.keep("c", marked(3));
    EXPECT_NE(memo.find("a"), nullptr); // now b is the oldest
    memo.keep("d", marked(4));
    EXPECT_EQ(memo.find("b"), nullptr);
    EXPECT_NE(memo.find("a"), nullptr);
    EXPECT_NE(memo.find("c"), nullptr);
    EXPECT_NE(memo.find("d"), nullptr);
}

TEST(Memo, never_holds_keys_of_more_bytes_than_it_may) {
    Memo memo(100, 1000);
    for (int i = 0; i < 9; ++i) {
        memo.keep(std::to_string(i) + std::string(399, 'x'), marked(i));
    }
    EXPECT_EQ(memo.entries(), 2U);
    EXPECT_EQ(memo.find("6" + std::string(399, 'x')), nullptr);
    EXPECT_NE(memo.find("7" + std::string(399, 'x')), nullptr);
    EXPECT_NE(memo.find("8" + std::string(399, 'x')), nullptr);
}

TEST(Memo, frees_the_bytes_of_what_it_drops) {
    Memo memo(2, 1000);
    for (int i = 0; i < 50; ++i) {
        memo.keep(std::to_string(i) + std::string(400, 'x'), marked(i));
    }
    EXPECT_EQ(memo.entries(), 2U);
}

TEST(Memo, does_not_keep_a_key_larger_than_all_its_room) {
    Memo memo(10, 1000);
    memo.keep("small", marked(0.1));
    memo.keep(std::string(1001, 'x'), marked(0.2));
    EXPECT_EQ(memo.find(std::string(1001, 'x')), nullptr);
    EXPECT_NE(memo.find("small"), nullptr);
}

TEST(Memo, keeps_a_key_of_exactly_all_its_room) {
    Memo memo(10, 1000);
    memo.keep("small", marked(0.1));
    memo.keep(std::string(1000, 'x'), marked(0.2));
    EXPECT_EQ(memo.find(std::string(1000, 'x'))->p, 0.2);
    EXPECT_EQ(memo.find("small"), nullptr);
}

TEST(Memo, of_no_entries_keeps_nothing) {
    Memo memo(0, 1000);
    memo.keep("key", marked(0.1));
    EXPECT_EQ(memo.find("key"), nullptr);
    EXPECT_EQ(memo.entries(), 0U);
}

TEST(Memo, an_outcome_that_was_handed_out_outlives_its_entry) {
    Memo memo(1, 1000);
    memo.keep("a", marked(0.125));
    const auto held = memo.find("a");
    memo.keep("b", marked(0.5));
    EXPECT_EQ(memo.find("a"), nullptr);
    EXPECT_EQ(held->p, 0.125);
}

// Each thread keeps and finds keys that the others use too, in a memo too small for all of them.
TEST(Memo, gives_eight_threads_the_outcome_of_their_key_or_none) {
    Memo memo(16, 300);
    std::atomic<int> wrong = 0;
    std::atomic<int> found = 0;
    std::vector<std::thread> threads;
    for (int t = 0; t < 8; ++t) {
        threads.emplace_back([&, t] {
            for (int i = 0; i < 4000; ++i) {
                const int number = (i * (t + 1)) % 40;
                const std::string key = "key " + std::to_string(number);
                memo.keep(key, marked(number));
                if (const auto outcome = memo.find(key)) {
                    ++found;
                    wrong += outcome->p == number ? 0 : 1;
                }
            }
        });
    }
    for (std::thread& thread : threads) {
        thread.join();
    }
    EXPECT_EQ(wrong, 0);
    EXPECT_GT(found, 0);
    EXPECT_LE(memo.entries(), 16U);
}

TEST(SharedMemo, is_one_for_all) {
    EXPECT_EQ(&shared_memo(), &shared_memo());
}

} // namespace
} // namespace rankstead
