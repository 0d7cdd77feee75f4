// Every study and every answer of the catalogue: a cell shows exactly what the library gives when it is called
// directly.
#include "calc_test.h"

#include <rankstead.h>

#include <cmath>

namespace calc_tests {
namespace {

// Ties, a zero difference and two decimals, in both arguments; no study refuses these as data.
const std::vector<double> first_data = {3.5, 4, 4, 5.25, 6, 7, 7.5, 9, 10, 12};
const std::vector<double> second_data = {4, 4, 5, 7.5, 7, 9.25, 8, 9.5, 13, 11.75};

struct Release {
    void operator()(rks_inquiry* inquiry) const { rks_inquiry_free(inquiry); }
};
using Inquiry = std::unique_ptr<rks_inquiry, Release>;

// The reference of a single study is one value; the other arguments here are columns.
std::vector<double> data_of(std::size_t study, std::size_t argument) {
    if (std::string(rks_argument_word(study, argument)) == "reference")
        return {4};
    return argument == 0 ? first_data : second_data;
}

class CalcCatalogue : public CalcTest {
protected:
    std::string put_data(std::size_t study) {
        std::string formula = "=" + std::string(rks_study_function(study)) + "(";
        for (std::size_t i = 0; i < rks_argument_count(study); ++i) {
            const std::string column(1, static_cast<char>('A' + i));
            const std::vector<double> values = data_of(study, i);
            document.put_down(column + "1", {values.begin(), values.end()});
            formula += column + "1:" + column + std::to_string(values.size()) + ";";
        }
        return formula;
    }
};

Shown asked_directly(std::size_t study, const char* answer, std::int32_t kind) {
    rks_inquiry* opened = nullptr;
    EXPECT_EQ(rks_inquiry_new(rks_study_word(study), &opened), RKS_OK);
    const Inquiry inquiry(opened);
    std::vector<std::vector<double>> data;
    for (std::size_t i = 0; i < rks_argument_count(study); ++i)
        data.push_back(data_of(study, i));
    for (std::size_t i = 0; i < data.size(); ++i)
        rks_inquiry_numbers(opened, rks_argument_word(study, i), data[i].data(), data[i].size(), 1);
    EXPECT_EQ(rks_inquiry_run(opened), RKS_OK);
    const char* text = nullptr;
    double number = NAN;
    if (kind == RKS_ANSWER_NUMBER && rks_inquiry_number(opened, answer, &number) == RKS_OK)
        return number;
    const rks_status status = rks_inquiry_text(opened, answer, &text, nullptr);
    return status == RKS_NO_ANSWER ? Shown(CellError::not_available) : Shown(std::string(text));
}

TEST_F(CalcCatalogue, EveryAnswerOfEveryStudy) {
    int compared = 0;
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        if (rks_study_form(study) != RKS_FORM_STUDY)
            continue;
        const std::string formula = put_data(study);
        for (std::size_t answer = 0; answer < rks_answer_count(); ++answer) {
            const std::int32_t kind = rks_answer_kind(answer);
            if (rks_answer_fits(answer, study) == 0 || kind == RKS_ANSWER_TABLE)
                continue;
            const char* word = rks_answer_word(answer);
            EXPECT_EQ(in_words(document.result_of(formula + "\"" + word + "\")")),
                      in_words(asked_directly(study, word, kind)))
                << rks_study_word(study) << ' ' << word;
            ++compared;
        }
    }
    EXPECT_GT(compared, 60);
}

TEST_F(CalcCatalogue, EveryAnswerOfEveryStudyWithoutData) {
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        if (rks_study_form(study) != RKS_FORM_STUDY)
            continue;
        const std::string formula = "=" + std::string(rks_study_function(study)) + "(;;\"";
        for (std::size_t answer = 0; answer < rks_answer_count(); ++answer) {
            if (rks_answer_fits(answer, study) == 0)
                continue;
            const Shown shown = document.result_of(formula + rks_answer_word(answer) + "\")");
            if (rks_answer_kind(answer) == RKS_ANSWER_NUMBER)
                EXPECT_TRUE(shows_error(shown, CellError::no_value)) << rks_answer_word(answer);
            else
                EXPECT_TRUE(std::holds_alternative<std::string>(shown)) << rks_answer_word(answer);
        }
    }
}

} // namespace
} // namespace calc_tests
