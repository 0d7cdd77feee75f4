# Compares the symbols that a library exports with a reviewed list.
#   cmake -DNM=nm -DLIBRARY=librankstead.so -DEXPECTED=rankstead.symbols -DVERSION_NODE=RANKSTEAD_1 -P CompareSymbols.cmake
cmake_minimum_required(VERSION 3.25)

execute_process(COMMAND ${NM} -D --defined-only ${LIBRARY}
    OUTPUT_VARIABLE table COMMAND_ERROR_IS_FATAL ANY)

# A line is: address, kind, name, with the version node behind the name. The node itself is listed as kind A.
string(REPLACE "\n" ";" lines "${table}")
set(exported)
foreach(line IN LISTS lines)
    if(line MATCHES "^[0-9a-f]* ([A-Za-z]) ([^@ ]+)(@@?(.+))?$")
        if(CMAKE_MATCH_1 STREQUAL "A" AND CMAKE_MATCH_2 STREQUAL VERSION_NODE)
            continue()
        endif()
        if(NOT CMAKE_MATCH_4 STREQUAL VERSION_NODE)
            message(SEND_ERROR "${CMAKE_MATCH_2} is not in the version node ${VERSION_NODE}")
        endif()
        list(APPEND exported ${CMAKE_MATCH_2})
    elseif(line)
        message(SEND_ERROR "Not understood: ${line}")
    endif()
endforeach()

file(STRINGS ${EXPECTED} expected REGEX "^[^#]")
foreach(symbol IN LISTS expected)
    if(NOT symbol IN_LIST exported)
        message(SEND_ERROR "${symbol} is in the list, but the library does not export it")
    endif()
endforeach()
foreach(symbol IN LISTS exported)
    if(NOT symbol IN_LIST expected)
        message(SEND_ERROR "The library exports ${symbol}, which is not in the list ${EXPECTED}")
    endif()
endforeach()

list(LENGTH exported count)
if(count EQUAL 0)
    message(SEND_ERROR "${LIBRARY} exports nothing")
endif()
message(STATUS "${count} exported symbols")
