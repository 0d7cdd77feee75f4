// What a caller hands over: cells, and rectangular blocks of them, read row by row.
#pragma once

#include <cstddef>
#include <functional>
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

// One data argument. Texts are borrowed. Large data stay where they are: then `cells` is empty and `lent` gives the
// cells, `lent_size` in number, one at a time.
struct Block {
    std::string argument;
    std::vector<Cell> cells;
    std::size_t rows = 0;
    std::size_t columns = 0;
    std::function<Cell(std::size_t)> lent = {};
    std::size_t lent_size = 0;

    [[nodiscard]] std::size_t size() const { return lent ? lent_size : cells.size(); }
    [[nodiscard]] Cell at(std::size_t index) const { return lent ? lent(index) : cells[index]; }
};

} // namespace rankstead
