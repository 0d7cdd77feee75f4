#include "shapes.h"

namespace rankstead::accuracy {

// Name, n, ties, levels, zeros, laws, seed.
const std::vector<SignShape>& sign_shapes() {
    static const std::vector<SignShape> shapes{
        {"changes_without_ties", 5, 1500, Ties::none, 0, false, 40, 101},
        {"changes_with_few_ties", 5, 1500, Ties::light, 0, false, 28, 102},
        {"changes_on_2_levels", 5, 1500, Ties::even_levels, 2, false, 24, 103},
        {"changes_on_3_levels", 5, 1500, Ties::even_levels, 3, false, 24, 104},
        {"changes_on_5_levels", 5, 1500, Ties::even_levels, 5, false, 24, 105},
        {"changes_on_13_levels", 5, 1500, Ties::even_levels, 13, false, 24, 106},
        {"changes_on_skew_levels", 5, 1500, Ties::skew_levels, 9, false, 20, 107},
        {"changes_mostly_of_one_size", 5, 1500, Ties::one_heavy, 0, false, 20, 108},
        {"changes_without_ties_and_ranked_zeros", 5, 1500, Ties::none, 0, true, 24, 109},
        {"changes_on_5_levels_and_ranked_zeros", 5, 1500, Ties::even_levels, 5, true, 24, 110},
        {"changes_mostly_of_one_size_and_ranked_zeros", 5, 1500, Ties::one_heavy, 0, true, 12, 111},
    };
    return shapes;
}

// Name, first sample, second to first, ties, levels, laws, seed.
const std::vector<ChoiceShape>& choice_shapes() {
    static const std::vector<ChoiceShape> shapes{
        {"balanced_without_ties", 5, 300, 1, 1, Ties::none, 0, 24, 201},
        {"balanced_with_few_ties", 5, 150, 1, 1, Ties::light, 0, 20, 202},
        {"balanced_on_2_levels", 5, 1000, 1, 1, Ties::even_levels, 2, 16, 203},
        {"balanced_on_3_levels", 5, 500, 1, 1, Ties::even_levels, 3, 20, 204},
        {"balanced_on_4_levels", 100, 200, 1, 1, Ties::even_levels, 4, 6, 230, 8},
        {"balanced_on_5_levels", 5, 150, 1, 1, Ties::even_levels, 5, 20, 205},
        {"balanced_on_13_levels", 5, 150, 1, 1, Ties::even_levels, 13, 20, 206},
        {"balanced_on_skew_levels", 5, 150, 1, 1, Ties::skew_levels, 9, 16, 207},
        {"balanced_mostly_of_one_value", 5, 150, 1, 1, Ties::one_heavy, 0, 20, 208},
        {"500_v_500_without_ties", 500, 500, 1, 1, Ties::none, 0, 4, 209, 4},
        {"500_v_500_with_few_ties", 500, 500, 1, 1, Ties::light, 0, 4, 210},
        {"500_v_500_on_5_levels", 500, 500, 1, 1, Ties::even_levels, 5, 4, 211},
        {"1000_v_1000_without_ties", 1000, 1000, 1, 1, Ties::none, 0, 2, 212},
        {"1_to_3_with_few_ties", 5, 70, 3, 3, Ties::light, 0, 12, 228},
        {"1_to_3_on_13_levels", 5, 70, 3, 3, Ties::even_levels, 13, 12, 229},
        {"1_to_10_without_ties", 3, 60, 10, 10, Ties::none, 0, 12, 213},
        {"1_to_10_on_5_levels", 3, 60, 10, 10, Ties::even_levels, 5, 16, 214},
        {"1_to_10_on_13_levels", 3, 40, 10, 10, Ties::even_levels, 13, 16, 215},
        {"1_to_10_with_few_ties", 3, 40, 10, 10, Ties::light, 0, 12, 216},
        {"1_to_100_without_ties", 2, 20, 100, 100, Ties::none, 0, 8, 217},
        {"1_to_100_with_few_ties", 2, 10, 100, 100, Ties::light, 0, 8, 218},
        {"1_to_100_on_5_levels", 2, 30, 100, 100, Ties::even_levels, 5, 12, 219},
        {"1_to_100_mostly_of_one_value", 2, 15, 100, 100, Ties::one_heavy, 0, 12, 220},
        {"1_to_20_with_few_ties", 5, 30, 20, 20, Ties::light, 0, 8, 231},
        {"1_to_20_on_13_levels", 5, 30, 20, 20, Ties::even_levels, 13, 8, 232},
        {"50_v_1000_on_5_levels", 50, 50, 20, 20, Ties::even_levels, 5, 6, 221},
        {"50_v_1000_on_13_levels", 50, 50, 20, 20, Ties::even_levels, 13, 3, 222, 8},
        {"50_v_1000_on_skew_levels", 50, 50, 20, 20, Ties::skew_levels, 9, 4, 223},
        {"50_v_1000_with_few_ties", 50, 50, 20, 20, Ties::light, 0, 3, 224, 8},
        {"one_against_many_without_ties", 1, 1, 10, 5000, Ties::none, 0, 8, 225},
        {"one_against_many_on_13_levels", 1, 1, 10, 5000, Ties::even_levels, 13, 8, 226},
        {"few_against_many_on_skew_levels", 2, 6, 100, 800, Ties::skew_levels, 9, 8, 227},
    };
    return shapes;
}

} // namespace rankstead::accuracy
