# Installs to an empty prefix, runs the installed program with the installed rules, and builds and runs
# the sample against the installed library.

function(run output)
    execute_process(COMMAND ${ARGN} OUTPUT_VARIABLE text COMMAND_ECHO STDOUT COMMAND_ERROR_IS_FATAL ANY)
    set(${output} "${text}" PARENT_SCOPE)
endfunction()

function(expect text pattern what)
    if(NOT text MATCHES "${pattern}")
        message(FATAL_ERROR "${what}: no \"${pattern}\" in\n${text}")
    endif()
endfunction()

set(prefix ${SCRATCH}/prefix)
file(REMOVE_RECURSE ${SCRATCH})
run(ignored ${CMAKE_COMMAND} --install ${BUILD_DIR} --prefix ${prefix})

# The rules that are read are those beside the program: a mark in them shows on the result.
set(mark "0.0-from-this-prefix")
set(set_file ${prefix}/share/isohydric/rules/sets/default.json)
file(READ ${set_file} set)
string(REGEX REPLACE "\"version\": *\"[^\"]*\"" "\"version\": \"${mark}\"" marked "${set}")
if(marked STREQUAL set)
    message(FATAL_ERROR "no version to mark in ${set_file}")
endif()
file(WRITE ${set_file} "${marked}")
run(checked ${prefix}/bin/isohydric check ${SOURCE_DIR}/samples/ward.json --format json)
string(JSON version GET "${checked}" rules version)
expect("${version}" "^${mark}$" "the installed program")
string(JSON interpretable GET "${checked}" interpretable)
expect("${interpretable}" "^(ON|true)$" "the installed program")

# A program of somebody else's, built from what was installed and nothing else.
run(ignored ${CMAKE_COMMAND} -S ${SOURCE_DIR}/samples/interpret_one -B ${SCRATCH}/sample -DCMAKE_PREFIX_PATH=${prefix}
    -DCMAKE_CXX_COMPILER=${CXX} -DCMAKE_CXX_FLAGS=${FLAGS})
run(ignored ${CMAKE_COMMAND} --build ${SCRATCH}/sample)
run(sample ${SCRATCH}/sample/interpret_one)
string(REGEX MATCH "^[^\n]+" caution "${sample}")
expect("${caution}" "Not a diagnostic device" "the sample's first line")
string(FIND "${sample}" "${caution}" first)
string(FIND "${sample}" "${caution}" last REVERSE)
if(first EQUAL last)
    message(FATAL_ERROR "the caution is not repeated at the end of\n${sample}")
endif()
expect("${sample}" "etabolic acidosis" "the sample")
message(STATUS "${sample}")
