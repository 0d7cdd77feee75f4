// Answers for programs: one JSON object.
#pragma once

#include "catalogue.h"
#include "inquiry.h"

#include <nlohmann/json.hpp>

#include <string>
#include <vector>

namespace rankstead::client {

using Json = nlohmann::ordered_json;

struct JsonReport {
    Json object;
    std::vector<std::string> reasons; // why answers cannot be given, one for each of these
};

// "build", "study", "answers", "messages" and "caution". A number is a number, and null where it is blank or cannot be
// given; messages then say why.
JsonReport json_report(const Inquiry& inquiry, const Study& study, const std::vector<Answer>& answers,
                       const std::vector<std::string>& messages);

// Whole numbers without a point.
Json json_number(double number);

// In UTF-8, whatever bytes the name of a file has.
std::string json_text(const Json& json);

} // namespace rankstead::client
