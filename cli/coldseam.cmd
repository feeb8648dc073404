@echo off
rem Starts Coldseam on Windows. Among its sources, builds it first if there is no build; once makes an
rem archive of loaded classes, which shortens every later start. JAVA_HOME is respected;
rem COLDSEAM_JAVA_OPTIONS is passed to Java.
setlocal
set "HERE=%~dp0"
for %%I in ("%HERE%..") do set "HOME_DIR=%%~fI"
set "JAR=%HOME_DIR%\cli\target\lib\coldseam.jar"
set "LAUNCH=%HOME_DIR%\cli\target\launch"
set "PROGRAM=cli/coldseam"
if exist "%HOME_DIR%\lib\coldseam.jar" (
  set "JAR=%HOME_DIR%\lib\coldseam.jar"
  set "LAUNCH=%HOME_DIR%\launch"
  set "PROGRAM=coldseam"
)
if not exist "%LAUNCH%" mkdir "%LAUNCH%" >nul 2>&1
rem Where that folder cannot be written, the archive stands under the user's own.
(copy /y nul "%LAUNCH%\writable" >nul 2>&1 && del "%LAUNCH%\writable" >nul 2>&1) || set "LAUNCH=%LOCALAPPDATA%\coldseam\%HOME_DIR::=%"
set "ARCHIVE=%LAUNCH%\classes.jsa"
set "OPTIONS=-XX:+UseG1GC -XX:TieredStopAtLevel=1 -XX:Tier3BackEdgeThreshold=2000 -XX:-UsePerfData -Xss4m -Djava.awt.headless=true"

set "JAVA_EXE=java"
if defined JAVA_HOME set "JAVA_EXE=%JAVA_HOME%\bin\java.exe"
"%JAVA_EXE%" -version >nul 2>&1
if errorlevel 1 (
  echo coldseam: needs Java 17 or newer: set JAVA_HOME to a JDK 1>&2
  exit /b 2
)

if not exist "%JAR%" (
  echo coldseam: building, once ... 1>&2
  if not exist "%LAUNCH%" mkdir "%LAUNCH%"
  pushd "%HOME_DIR%"
  call mvn -B -ntp -q "-Dmaven.test.skip=true" "-Dzip.skip=true" -pl cli -am package > "%LAUNCH%\build.log" 2>&1
  if errorlevel 1 (
    popd
    type "%LAUNCH%\build.log" 1>&2
    echo coldseam: the build failed; it needs Maven 3.8 and a JDK, 17 or newer 1>&2
    exit /b 70
  )
  popd
)

if not exist "%ARCHIVE%" (
  if not exist "%LAUNCH%" mkdir "%LAUNCH%" >nul 2>&1
  "%JAVA_EXE%" %OPTIONS% "-XX:DumpLoadedClassList=%LAUNCH%\classes.list" "-Dcoldseam.home=%HOME_DIR%" -cp "%JAR%" coldseam.cli.Main solve "%HOME_DIR%\cases\demo\balcony.yaml" --out "%LAUNCH%\training" >nul 2>&1
  "%JAVA_EXE%" %OPTIONS% -Xshare:dump "-XX:SharedClassListFile=%LAUNCH%\classes.list" "-XX:SharedArchiveFile=%ARCHIVE%" -cp "%JAR%" >nul 2>&1
)
set "SHARE="
if exist "%ARCHIVE%" set "SHARE=-XX:SharedArchiveFile="%ARCHIVE%" -Xlog:cds=off"

"%JAVA_EXE%" %OPTIONS% %COLDSEAM_JAVA_OPTIONS% %SHARE% "-Dcoldseam.home=%HOME_DIR%" "-Dcoldseam.program=%PROGRAM%" -cp "%JAR%" coldseam.cli.Main %*
exit /b %ERRORLEVEL%
