#include "range.h"

#include <gtest/gtest.h>
#include <rtl/ustring.hxx>

namespace rankstead::calc {
namespace {

using com::sun::star::uno::Any;
using com::sun::star::uno::Sequence;
using Row = Sequence<Any>;

const Any blank_cell = Any(rtl::OUString());

Row row(std::initializer_list<Any> cells) {
    return {cells.begin(), static_cast<sal_Int32>(cells.size())};
}

Any block(std::initializer_list<Row> rows) {
    return Any(Sequence<Row>(rows.begin(), static_cast<sal_Int32>(rows.size())));
}

TEST(Range, NothingIsNotGiven) {
    EXPECT_FALSE(Range(Any()).given());
    EXPECT_FALSE(Range(block({})).given());
    EXPECT_FALSE(Range(block({Row(), Row()})).given());
    EXPECT_EQ(Range(Any()).filled_rows(), 0U);
}

TEST(Range, OneValueIsOneCell) {
    const Range range(Any(2.5));
    EXPECT_TRUE(range.given());
    EXPECT_EQ(range.rows(), 1U);
    EXPECT_EQ(range.columns(), 1U);
    EXPECT_EQ(range.at(0, 0), Any(2.5));
}

TEST(Range, CellsAreWhereTheyWere) {
    const Range range(block({row({Any(1.0), Any(2.0)}), row({Any(3.0), Any(4.0)}), row({Any(5.0), Any(6.0)})}));
    EXPECT_EQ(range.rows(), 3U);
    EXPECT_EQ(range.columns(), 2U);
    EXPECT_EQ(range.at(2, 0), Any(5.0));
    EXPECT_EQ(range.at(0, 1), Any(2.0));
}

TEST(Range, TrailingBlankRowsAreNotFilled) {
    const Row nothing = row({blank_cell, Any()});
    EXPECT_EQ(Range(block({nothing, row({blank_cell, Any(0.0)}), nothing, nothing})).filled_rows(), 2U);
    EXPECT_EQ(Range(block({nothing, nothing})).filled_rows(), 0U);
    EXPECT_EQ(Range(block({row({Any(0.0), Any()})})).filled_rows(), 1U) << "a zero is a value";
}

TEST(Range, WhatAShortRowLacksIsBlank) {
    const Range range(block({row({Any(1.0), Any(2.0)}), row({Any(3.0)}), Row()}));
    EXPECT_TRUE(is_blank(range.at(1, 1)));
    EXPECT_TRUE(is_blank(range.at(2, 0)));
    EXPECT_EQ(range.filled_rows(), 2U);
}

} // namespace
} // namespace rankstead::calc
