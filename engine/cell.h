// What a caller hands over: cells, and rectangular blocks of them, read row by row.
#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

namespace rankstead {

struct Cell {
    enum class Kind { blank, number, text };
    Kind kind = Kind::blank;
    double number = 0;
    std::string_view text;

    static Cell of(double number) { return {Kind::number, number, {}}; }
    static Cell of(std::string_view text) { return {Kind::text, 0, text}; }
};

// One data argument. Cells and their texts are borrowed.
struct Block {
    std::string argument;
    std::vector<Cell> cells;
    std::size_t rows = 0;
    std::size_t columns = 0;
};

} // namespace rankstead
