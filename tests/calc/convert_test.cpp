#include "cell_error.h"
#include "convert.h"
#include "text.h"

#include <com/sun/star/uno/XInterface.hpp>
#include <gtest/gtest.h>

#include <cmath>
#include <cstring>
#include <stdexcept>

namespace rankstead::calc {
namespace {

using calc_tests::wide;
using com::sun::star::uno::Any;
using com::sun::star::uno::Reference;
using com::sun::star::uno::Sequence;
using com::sun::star::uno::XInterface;

rks_cell only_cell(const Cells& cells) {
    EXPECT_EQ(cells.rows() * cells.columns(), 1U);
    return *cells.data();
}

std::string text_in(const rks_cell& cell) {
    return {cell.text, cell.length};
}

std::uint64_t bits_of(const Any& value) {
    double number = 0;
    EXPECT_TRUE(value >>= number);
    std::uint64_t bits = 0;
    std::memcpy(&bits, &number, sizeof bits);
    return bits;
}

TEST(Cells, NumbersAndBlanks) {
    const rks_cell number = only_cell(Cells(Range(Any(-0.5)), 1));
    EXPECT_EQ(number.kind, RKS_CELL_NUMBER);
    EXPECT_EQ(number.number, -0.5);
    EXPECT_EQ(only_cell(Cells(Range(Any(sal_Int32(7))), 1)).number, 7);
    EXPECT_EQ(only_cell(Cells(Range(Any(rtl::OUString())), 1)).kind, RKS_CELL_BLANK);
}

TEST(Cells, TextsBecomeUtf8) {
    const Cells cells(Range(Any(wide("<5 µg/l \U0001F48A"))), 1);
    EXPECT_EQ(only_cell(cells).kind, RKS_CELL_TEXT);
    EXPECT_EQ(text_in(only_cell(cells)), "<5 µg/l \U0001F48A");
}

TEST(Cells, AHalfCharacterIsStillUtf8) {
    const sal_Unicode half[] = {'a', 0xd83d, 'b'};
    const Cells cells(Range(Any(rtl::OUString(half, 3))), 1);
    EXPECT_EQ(text_in(only_cell(cells)).find("\xed\xa0"), std::string::npos) << "a surrogate is not UTF-8";
}

TEST(Cells, OnlyTheFirstRows) {
    const Any cell(1.0);
    const Sequence<Any> row(&cell, 1);
    const Sequence<Any> rows[] = {row, row, row};
    const Range range(Any(Sequence<Sequence<Any>>(rows, 3)));
    EXPECT_EQ(Cells(range, 2).rows(), 2U);
    EXPECT_EQ(Cells(range, 0).rows(), 0U);
    EXPECT_NE(Cells(range, 0).data(), nullptr);
}

TEST(Cells, WhatIsNoCellIsRefused) {
    EXPECT_THROW(Cells(Range(Any(Reference<XInterface>())), 1), std::invalid_argument);
    EXPECT_THROW(Cells(Range(Any(Sequence<double>(3))), 1), std::invalid_argument);
}

TEST(ToCalc, TextsAndNumbers) {
    EXPECT_EQ(to_calc("µ only", 2), Any(wide("µ")));
    EXPECT_EQ(to_calc(0.1), Any(0.1));
}

TEST(ToCalc, TablesHaveNoHolesAndKeepErrors) {
    const rks_cell table[] = {{RKS_CELL_TEXT, 0, 0, "lower", 5},
                              {RKS_CELL_STATUS, 0, static_cast<double>(RKS_NO_ANSWER), nullptr, 0},
                              {RKS_CELL_BLANK, 0, 0, nullptr, 0},
                              {RKS_CELL_STATUS, 0, static_cast<double>(RKS_BLANK), nullptr, 0}};
    Sequence<Sequence<Any>> block;
    ASSERT_TRUE(to_calc(table, 2, 2) >>= block);
    const Sequence<Sequence<Any>>& rows = block;
    EXPECT_EQ(rows[0][0], Any(rtl::OUString("lower")));
    EXPECT_EQ(bits_of(rows[0][1]), 0x7ff8000000000000U + 32767);
    EXPECT_EQ(rows[1][0], Any(rtl::OUString()));
    EXPECT_EQ(rows[1][1], Any(rtl::OUString()));
}

TEST(CellError, EveryStatusHasOne) {
    EXPECT_EQ(cell_error_for(RKS_UNKNOWN_ANSWER), CellError::invalid_argument);
    EXPECT_EQ(cell_error_for(RKS_BAD_SETTING), CellError::invalid_argument);
    EXPECT_EQ(cell_error_for(RKS_UNKNOWN_SETTING), CellError::invalid_argument);
    EXPECT_EQ(cell_error_for(RKS_NO_ANSWER), CellError::not_available);
    const rks_status others[] = {RKS_BAD_DATA,      RKS_NO_DATA,  RKS_UNEQUAL_LENGTHS, RKS_TOO_LARGE,
                                 RKS_OUT_OF_MEMORY, RKS_INTERNAL, RKS_BAD_CALL,        12345};
    for (const rks_status status : others)
        EXPECT_EQ(cell_error_for(status), CellError::no_value) << status;
}

} // namespace
} // namespace rankstead::calc
