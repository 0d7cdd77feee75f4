# Runs the installed command: it has to find the installed library beside it.
#   cmake -DCOMMAND=.. -DVERSION=.. -P command.cmake
cmake_minimum_required(VERSION 3.25)
execute_process(COMMAND ${COMMAND} --version OUTPUT_VARIABLE output COMMAND_ERROR_IS_FATAL ANY)
string(FIND "${output}" "${VERSION}" at)
if(at EQUAL -1)
    message(FATAL_ERROR "${COMMAND} --version does not name version ${VERSION}: ${output}")
endif()
execute_process(COMMAND ${COMMAND} tail signed-rank --n 10 --statistic 8 --side lower
    OUTPUT_VARIABLE output COMMAND_ERROR_IS_FATAL ANY)
if(NOT output STREQUAL "0.0244140625\n") # 25/1024
    message(FATAL_ERROR "The installed command printed ${output}")
endif()
