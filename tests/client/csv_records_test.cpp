#include "csv_records.h"

#include "failure.h"

#include <gtest/gtest.h>

namespace rankstead::client {
namespace {

using Records = std::vector<Record>;

Records records(std::string_view text) {
    return csv_records(text, ',', "a.csv");
}

TEST(CsvRecords, FieldsAndRecords) {
    EXPECT_EQ(records("a,b\n1,2\n"), (Records{{"a", "b"}, {"1", "2"}}));
    EXPECT_EQ(records("a,b\n1,2"), (Records{{"a", "b"}, {"1", "2"}}));
    EXPECT_EQ(records("a,,\n"), (Records{{"a", "", ""}}));
    EXPECT_EQ(records(""), Records{});
}

TEST(CsvRecords, EveryKindOfLineEnd) {
    const Records expected{{"a"}, {}, {"b"}, {}};
    EXPECT_EQ(records("a\n\nb\n\n"), expected);
    EXPECT_EQ(records("a\r\n\r\nb\r\n\r\n"), expected);
    EXPECT_EQ(records("a\r\rb\r\r"), expected);
}

TEST(CsvRecords, QuotationMarks) {
    EXPECT_EQ(records("\"a,\"\"b\"\"\",\"c\nd\"\n"), (Records{{"a,\"b\"", "c\nd"}}));
    EXPECT_EQ(records("\"\"\n"), (Records{{""}}));
}

TEST(CsvRecords, BlanksAroundFields) {
    EXPECT_EQ(records(" a ,\tb \n"), (Records{{"a", "b"}}));
}

TEST(CsvRecords, ALineOfBlanksIsEmpty) {
    EXPECT_EQ(records("a\n  \nb"), (Records{{"a"}, {}, {"b"}}));
}

TEST(CsvRecords, QuotationMarksThatDoNotMatch) {
    for (const char* text : {"a\n\"b\n", "a\nb\"c\n", "a\n\"b\"c\n"}) {
        try {
            records(text);
            ADD_FAILURE() << text;
        } catch (const Failure& failure) {
            EXPECT_EQ(failure.exit(), Exit::data);
            EXPECT_EQ(std::string(failure.what()).find("a.csv, row 2: "), 0U) << failure.what();
        }
    }
}

} // namespace
} // namespace rankstead::client
