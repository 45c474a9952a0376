@echo off
rem Starts settlewell with the first Java 17 or newer it finds, as the file `settlewell` beside this
rem one does elsewhere. Written with care and never tried: nobody has run it on Windows yet.
setlocal EnableExtensions DisableDelayedExpansion

set "HERE=%~dp0"
set "JAR="
for %%J in ("%HERE%settlewell.jar" "%HERE%..\lib\settlewell.jar" "%HERE%..\target\settlewell.jar") do (
  if not defined JAR if exist "%%~J" set "JAR=%%~J"
)
if not defined JAR (
  echo settlewell: settlewell.jar is not there; build it with: mvn -DskipTests package 1>&2
  exit /b 2
)

set "FOUND="
if defined JAVA_HOME call :try "%JAVA_HOME%"
if not defined FOUND for %%P in (java.exe) do if not "%%~$PATH:P"=="" call :try "%%~dp$PATH:P.."
if not defined FOUND for /d %%D in ("%ProgramFiles%\Java\*" "%ProgramFiles%\Eclipse Adoptium\*") do call :try "%%~D"
if not defined FOUND (
  echo settlewell: no Java 17 or newer was found; install one, or set JAVA_HOME to it 1>&2
  exit /b 2
)
"%FOUND%\bin\java.exe" -XX:+UseSerialGC -jar "%JAR%" %*
exit /b %ERRORLEVEL%

rem The version stands in the JDK's release file: JAVA_VERSION="17.0.15", or "1.8.0_402" of old.
:try
if defined FOUND exit /b 0
if not exist "%~1\bin\java.exe" exit /b 0
if not exist "%~1\release" exit /b 0
set "MAJOR="
for /f "usebackq tokens=2 delims==" %%V in (`findstr /b "JAVA_VERSION=" "%~1\release"`) do (
  for /f "tokens=1 delims=." %%M in ("%%~V") do set "MAJOR=%%M"
)
if not defined MAJOR exit /b 0
if %MAJOR% GEQ 17 set "FOUND=%~1"
exit /b 0
